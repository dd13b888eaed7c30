import type { people } from '../../../drizzle/schema'
import type { PersonLine } from '../../../utils/contract/people'
import type { Directory } from '../directory/directory'
import { isTrainee, rolesOf } from '../session/person'

/** A stored person as others see it; the address only where they may. */
export function personLine(row: typeof people.$inferSelect, from: Directory, mayReadContact: boolean): PersonLine {
  const supervisor = row.supervisorId === null ? undefined : from.people.get(row.supervisorId)
  return {
    id: row.id,
    name: row.name,
    email: mayReadContact ? row.email : null,
    roles: rolesOf(row),
    trainee: isTrainee(row),
    certification: row.certification,
    certificationType: row.certificationType,
    certificationNumber: row.certificationNumber,
    supervisor: supervisor ? { id: supervisor.id, name: supervisor.name } : null,
    vans: [...from.places.values()]
      .filter(({ kind, technicianId, active }) => kind === 'van' && technicianId === row.id && active)
      .map(({ id, name }) => ({ id, name }))
      .sort((a, b) => a.name.localeCompare(b.name, 'en')),
    active: row.active,
    invited: row.passwordHash === null,
  }
}
