import type { Role } from './roles'

/** A person as a list of the firm shows them. */
interface Candidate { id: string, name: string, roles: readonly Role[], trainee: boolean, active: boolean, certification: string | null }

/** Those who may supervise a trainee: certified, active, no trainees themselves. */
export function supervisorsFor<Person extends Candidate>(people: readonly Person[], traineeId: string): Person[] {
  return people.filter(person => person.active && !person.trainee && person.id !== traineeId
    && person.certification !== null && person.roles.some(role => role === 'technician' || role === 'manager'))
}
