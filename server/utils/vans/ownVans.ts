import type { Directory } from '../directory/directory'

/** The vans in use of a technician, by name; one may have a second for a while. */
export function ownVans(from: Directory, personId: string) {
  return [...from.places.values()]
    .filter(({ kind, active, technicianId }) => kind === 'van' && active && technicianId === personId)
    .sort((a, b) => a.name.localeCompare(b.name, 'en') || (a.id < b.id ? -1 : 1))
}
