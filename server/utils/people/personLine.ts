import type { people } from '../../../drizzle/schema'
import type { PersonLine } from '../../../utils/contract/people'
import { rolesOf } from '../session/person'

/** A stored person as others see it; the address only where they may. */
export function personLine(row: typeof people.$inferSelect, mayReadContact: boolean): PersonLine {
  return {
    id: row.id,
    name: row.name,
    email: mayReadContact ? row.email : null,
    roles: rolesOf(row),
    trainee: row.trainee,
    certification: row.certification,
    active: row.active,
    invited: row.passwordHash === null,
  }
}
