import type { people } from '../../../drizzle/schema'
import type { ProblemError } from '../../../utils/contract/problem'
import type { Directory } from '../directory/directory'
import { problem } from '../http/problem'
import { isTrainee } from '../session/person'
import { maySupervise } from './maySupervise'

type PersonRow = typeof people.$inferSelect
type Told = Pick<PersonRow, 'id' | 'roles' | 'trainee' | 'certificationType' | 'certificationNumber'>

/**
 * Refuses a person whose parts do not fit together; what is in `given` only where it is being given.
 *
 * Errors: 422, each fault beside its field.
 */
export function refuseMisfit(from: Directory, person: Told, given: { trainee?: boolean, supervisorId?: string | null, vanId?: string | null }): void {
  const errors: ProblemError[] = []
  if (person.certificationNumber !== null && person.certificationType === null) {
    errors.push({ path: 'certificationNumber', message: 'choose the type that the number belongs to' })
  }
  if (given.trainee && !isTrainee(person)) errors.push({ path: 'trainee', message: 'only a technician is a trainee' })
  if (given.supervisorId) errors.push(...supervisorFaults(from, person, given.supervisorId))
  if (given.vanId) errors.push(...vanFaults(from, person, given.vanId))
  if (errors.length > 0) throw problem(422, 'This person cannot be', 'Mend what is named.', errors)
}

function supervisorFaults(from: Directory, person: Told, supervisorId: string): ProblemError[] {
  if (!isTrainee(person)) return [{ path: 'supervisorId', message: 'only a trainee has a supervisor' }]
  if (maySupervise(from, supervisorId, person.id)) return []
  return [{ path: 'supervisorId', message: 'must be a certified technician or manager in service, and no trainee' }]
}

function vanFaults(from: Directory, person: Told, vanId: string): ProblemError[] {
  if (!person.roles.includes('technician')) return [{ path: 'vanId', message: 'only a technician has a van' }]
  const van = from.places.get(vanId)
  return van?.kind === 'van' && van.active ? [] : [{ path: 'vanId', message: 'no such van in use' }]
}
