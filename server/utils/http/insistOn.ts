import { can, type Permission } from '../../../utils/access/permissions'
import type { User } from '../../../utils/contract/session'
import { useDatabase } from '../database/currentDatabase'
import { securityEntry } from '../securityLog'
import { accessOf } from '../session/currentUser'
import { problem } from './problem'

/**
 * Refuses whoever does not hold a permission.
 *
 * Errors: 403, with a line in the security log.
 */
export async function insistOn(person: User, permission: Permission): Promise<void> {
  if (can(accessOf(person), permission)) return
  await useDatabase().write([securityEntry({ what: 'refused', personId: person.id, subject: permission }, Date.now())])
  throw problem(403, 'Not yours', 'Your role does not include this.', undefined, { type: 'not-permitted' })
}
