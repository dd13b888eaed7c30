import type { Place } from '~~/utils/contract/places'
import type { ProblemError } from '~~/utils/contract/problem'
import type { Directory } from '../directory/directory'
import { rolesOf } from '../session/person'

/**
 * Why a place cannot be as told: who or what it names must be there, and no place stands inside itself, a closed place,
 * a firm's or a van. What a van carries is reckoned from what stands in the van itself. It is given only to a technician
 * in service.
 *
 * @param before is the place as it stands: a van whose technician has left may keep that name until it is given away.
 */
export function placeErrors(from: Directory, place: Pick<Place, 'id' | 'kind' | 'parentId' | 'technicianId'>, before: Pick<Place, 'technicianId'> | null = null): ProblemError[] {
  const errors: ProblemError[] = []
  const parent = place.parentId === null ? null : from.places.get(place.parentId)
  if (parent === undefined) errors.push({ path: 'parentId', message: 'no such place' })
  else if (parent !== null && (!parent.active || parent.kind === 'van' || parent.kind === 'firm')) errors.push({ path: 'parentId', message: 'must be in use, and no van and no firm' })
  else if (isInside(from, place.parentId, place.id)) errors.push({ path: 'parentId', message: 'a place cannot stand inside itself' })
  if (place.technicianId !== null) {
    const person = from.people.get(place.technicianId)
    const isGiven = place.technicianId !== before?.technicianId
    if (!person) errors.push({ path: 'technicianId', message: 'no such person' })
    else if (isGiven && !(person.active && rolesOf(person).includes('technician'))) errors.push({ path: 'technicianId', message: 'must be a technician in service' })
    if (place.kind !== 'van') errors.push({ path: 'technicianId', message: 'only a van has a technician' })
  }
  return errors
}

function isInside(from: Directory, startId: string | null, id: string): boolean {
  const seen = new Set<string>()
  for (let at = startId; at !== null && !seen.has(at); at = from.places.get(at)?.parentId ?? null) {
    if (at === id) return true
    seen.add(at)
  }
  return false
}
