import type { Place } from '../../../utils/contract/places'
import type { VanAnswer, VanSummary } from '../../../utils/contract/vans'
import { cylinderRowsWhere } from '../custody/fleet'
import type { Database } from '../database/database'
import { directory, namesOf } from '../directory/directory'
import { problem } from '../http/problem'
import { listPlaces, placeById } from '../places/places'
import { lastCheckIn, toLookFor } from './checkIns'
import { materialsByVan, materialsOf } from './materials'
import { standingIn } from './standingIn'

/** Everything about one van. Errors: 404 where there is no van of this id. */
export async function vanAnswer(db: Database, id: string, now: number): Promise<VanAnswer> {
  const [van, from, checkIn] = await Promise.all([theVan(db, id), directory(db), lastCheckIn(db, id)])
  const [aboard, heldElsewhere, materials, missing] = await Promise.all([
    standingIn(db, id, now),
    van.technicianId === null
      ? []
      : cylinderRowsWhere(db, { sql: 'c.holder_id = ? AND c.place_id IS NOT ?', args: [van.technicianId, id] }, null, now),
    materialsOf(db, id, from),
    toLookFor(db, checkIn, from, now),
  ])
  const checked = checkIn && { checkedBy: namesOf(from).person(checkIn.checkedBy), checkedAt: new Date(checkIn.checkedAt).toISOString() }
  return { van, aboard, heldElsewhere, materials, toLookFor: missing, lastCheckIn: checked }
}

/** Every van in use, by name, with what it carries and what is to be looked for. */
export async function listVans(db: Database, now: number): Promise<VanSummary[]> {
  const from = await directory(db)
  const [vans, materials] = await Promise.all([
    listPlaces(db, { active: true }).then(places => places.filter(({ kind }) => kind === 'van')),
    materialsByVan(db, from),
  ])
  return Promise.all(vans.map(async (van) => {
    const aboard = await standingIn(db, van.id, now)
    return {
      van,
      aboard: aboard.map(({ tareWeightGrams, netGrams }) => ({ tareWeightGrams, netGrams })),
      materials: materials.get(van.id) ?? null,
      toLookFor: await toLookFor(db, await lastCheckIn(db, van.id), from, now),
    }
  }))
}

/** A van by its id. Errors: 404. */
export async function theVan(db: Database, id: string): Promise<Place> {
  const place = await placeById(db, id)
  if (place?.kind !== 'van') throw problem(404, 'No such van', 'It may have been written wrongly.')
  return place
}
