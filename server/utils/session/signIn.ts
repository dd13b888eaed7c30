import { and, eq } from 'drizzle-orm'
import { people } from '../../../drizzle/schema'
import type { User } from '../../../utils/contract/session'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { problem, type Problem } from '../http/problem'
import { securityEntry } from '../securityLog'
import { attemptSucceeded, beginAttempt } from './attempts'
import { hashNewPassword, isOutdated, passwordMatches } from './password'
import { userOf } from './person'
import { endSession, newSession } from './sessions'

/** One try at signing in. */
export interface SignInTry {
  email: string
  password: string
  /** Network address. */
  address: string
  /** The secret the browser came with, if any: that session ends. */
  replaces: string | null
  now: number
}

/**
 * Signs a person in and answers the secret for the cookie.
 *
 * Errors: 401, the same for an unknown address, a wrong password, one turned off and one who has not taken up the
 * invitation; 429 after many tries.
 */
export async function signIn(attempt: SignInTry): Promise<{ user: User, sid: string }> {
  const { email, password, address, now } = attempt
  await beginAttempt(email, address, now)
  const { read, write } = useDatabase()
  const [row] = await read.select().from(people).where(eq(people.email, email)).limit(1)
  const stored = row?.active ? row.passwordHash : null
  if (!await passwordMatches(stored, password) || !row || !stored) throw await refused(row?.id ?? null, address, now)
  const { sid, store } = newSession(row.id, stored, now)
  const [stands] = await write([
    store,
    ...(attempt.replaces ? [endSession(attempt.replaces)] : []),
  ])
  if (stands?.rows.length === 0) throw await refused(row.id, address, now)
  attemptSucceeded(email, address)
  await write([securityEntry({ what: 'signed-in', personId: row.id, subject: address }, now)])
  if (isOutdated(stored)) await renewHash(row.id, stored, password)
  return { user: userOf(row), sid }
}

async function refused(personId: string | null, address: string, now: number): Promise<Problem> {
  await useDatabase().write([securityEntry({ what: 'sign-in-refused', personId, subject: address }, now)])
  return problem(401, 'Not signed in', 'That address and password do not go together.', undefined, { type: 'wrong-sign-in' })
}

async function renewHash(personId: string, outdated: string, password: string): Promise<void> {
  const passwordHash = await hashNewPassword(password)
  const { read, write } = useDatabase()
  await write([statement(read.update(people).set({ passwordHash }).where(and(eq(people.id, personId), eq(people.passwordHash, outdated))))])
}
