import type { H3Event } from 'h3'
import type { Access } from '../../../utils/access/roles'
import type { User } from '../../../utils/contract/session'
import { readSessionSecret } from './sessionCookie'
import { personOfSession } from './sessions'

const KEY = 'collarbookUser'

/** Who is signed in, looked up once a request and only when asked; null for nobody. */
export function currentUser(event: H3Event): Promise<User | null> {
  event.context[KEY] ??= lookUp(event)
  return event.context[KEY] as Promise<User | null>
}

/** What `can()` needs to know of a person. */
export function accessOf(user: User): Access {
  return { personId: user.id, roles: user.roles, trainee: user.trainee }
}

async function lookUp(event: H3Event): Promise<User | null> {
  const sid = await readSessionSecret(event)
  return sid ? personOfSession(sid, Date.now()) : null
}
