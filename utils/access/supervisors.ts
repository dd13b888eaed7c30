import { isCertified, type Certification } from './certification'
import type { Role } from './roles'

/** A person as a list of the firm shows them. */
type Candidate = Pick<Certification, 'certificationType' | 'certification'> & { id: string, name: string, roles: readonly Role[], trainee: boolean, active: boolean }

/**
 * Those who may supervise a trainee: certified, active, no trainees themselves.
 *
 * Source: 40 CFR 82.161(a): an apprentice is exempt only under the close and continual supervision of a certified technician.
 */
export function supervisorsFor<Person extends Candidate>(people: readonly Person[], traineeId: string): Person[] {
  return people.filter(person => person.active && !person.trainee && person.id !== traineeId
    && isCertified(person) && person.roles.some(role => role === 'technician' || role === 'manager'))
}

/** Who usually supervises a trainee, as a form begins with it: '' where nobody is named or that person may no longer. */
export function usualSupervisorId(people: readonly (Candidate & { supervisor: { id: string } | null })[], traineeId: string): string {
  const usual = people.find(({ id }) => id === traineeId)?.supervisor?.id
  return supervisorsFor(people, traineeId).find(({ id }) => id === usual)?.id ?? ''
}
