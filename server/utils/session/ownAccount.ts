import { and, eq } from 'drizzle-orm'
import { people } from '../../../drizzle/schema'
import type { Units, User } from '../../../utils/contract/session'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { problem } from '../http/problem'
import { securityEntry } from '../securityLog'
import { attemptSucceeded, beginAttempt } from './attempts'
import { hashNewPassword, passwordMatches } from './password'
import { refuseWeakPassword } from './passwordRules'
import { endSessionsOf, newSession } from './sessions'

/**
 * Changes one's own password. Every session of the person ends; the new one's secret is answered.
 *
 * Errors: 403 when the present password is wrong, 429 after many tries, 422 for a weak new one, 409 when it was changed meanwhile.
 */
export async function changePassword(user: User, current: string, next: string, now: number): Promise<string> {
  // Whoever holds the session is one caller, wherever they are.
  await beginAttempt(user.id, user.id, now)
  const { read, write } = useDatabase()
  const [row] = await read.select({ passwordHash: people.passwordHash }).from(people).where(eq(people.id, user.id)).limit(1)
  const stored = row?.passwordHash ?? null
  if (!stored || !await passwordMatches(stored, current)) {
    await write([securityEntry({ what: 'password-change-refused', personId: user.id }, now)])
    throw problem(403, 'Not your password', 'The present password is not right.', [{ path: 'current', message: 'is not right' }], { type: 'wrong-password' })
  }
  attemptSucceeded(user.id, user.id)
  refuseWeakPassword(next, user.email, 'next')
  const passwordHash = await hashNewPassword(next)
  const { sid, store } = newSession(user.id, passwordHash, now)
  const unchanged = and(eq(people.id, user.id), eq(people.passwordHash, stored))
  // In one commit: with another password no session of before may stand, not even where the server ends in between.
  const [updated] = await write([
    statement(read.update(people).set({ passwordHash }).where(unchanged).returning({ id: people.id })),
    endSessionsOf(user.id, passwordHash),
    store,
  ])
  if (updated?.rows.length === 0) throw problem(409, 'Changed meanwhile', 'The password was changed meanwhile.')
  await write([securityEntry({ what: 'password-changed', personId: user.id }, now)])
  return sid
}

/** Changes the units a person reads weights in. */
export async function changeUnits(user: User, units: Units): Promise<User> {
  const { read, write } = useDatabase()
  await write([statement(read.update(people).set({ units }).where(eq(people.id, user.id)))])
  return { ...user, units }
}
