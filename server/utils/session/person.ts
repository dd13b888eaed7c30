import type { people } from '../../../drizzle/schema'
import { ROLES, type Role } from '../../../utils/access/roles'
import type { User } from '../../../utils/contract/session'

type PersonRow = typeof people.$inferSelect

/** The roles of a stored person; a word that is no role gives no right. */
export function rolesOf(row: Pick<PersonRow, 'roles'>): Role[] {
  return ROLES.filter(role => row.roles.includes(role))
}

/** Whether somebody's events wait for a supervisor's signature: only a technician is trained. */
export function isTrainee({ roles, trainee }: Pick<PersonRow, 'roles' | 'trainee'>): boolean {
  return trainee && roles.includes('technician')
}

/** A stored person as the screens know who is signed in. */
export function userOf(row: PersonRow): User {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    roles: rolesOf(row),
    trainee: isTrainee(row),
    certification: row.certification,
    certificationType: row.certificationType,
    certificationNumber: row.certificationNumber,
    units: row.units,
  }
}
