import { eq } from 'drizzle-orm'
import { places } from '~~/drizzle/schema'
import type { Place, PlaceChange } from '~~/utils/contract/places'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { placeErrors } from './placeErrors'
import { placeById } from './places'

/**
 * Changes a place of ours.
 *
 * Errors: 404; 409 for a firm's own place, and for closing one where cylinders stand or that has a place in use inside it;
 * 422 for what it names.
 */
export async function changePlace(db: Database, id: string, change: PlaceChange): Promise<Place> {
  // What is checked here must still hold when it is written.
  await db.exclusive(async (commit) => {
    const place = await placeById(db, id)
    if (!place) throw problem(404, 'No such place', 'It may have been written wrongly.')
    if (place.firmId !== null) throw problem(409, 'This place belongs to a firm', 'Change the firm; its place follows.')
    if (change.active === false && place.active && place.cylinders > 0) {
      throw problem(409, 'Cylinders stand there', `Move the ${place.cylinders} away first; then it can be closed.`)
    }
    const from = await directory(db, true)
    const inside = change.active === false && [...from.places.values()].find(each => each.parentId === id && each.active)
    if (inside) throw problem(409, 'Another place is inside it', `Move or close ${inside.name} first; then it can be closed.`)
    const { name = place.name, parentId = place.parentId, technicianId = place.technicianId, active = place.active } = change
    const errors = placeErrors(from, { id, kind: place.kind, parentId, technicianId }, place)
    if (errors.length > 0) throw problem(422, 'This place cannot be', 'Mend what is named.', errors)
    await commit([statement(db.read.update(places).set({ name, parentId, technicianId, active }).where(eq(places.id, id)))])
  })
  await directory(db, true)
  return (await placeById(db, id))!
}
