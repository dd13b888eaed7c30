import { setTimeout as pauseFor } from 'node:timers/promises'
import { eq } from 'drizzle-orm'
import { people } from '../../../drizzle/schema'
import type { User } from '../../../utils/contract/session'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { problem } from '../http/problem'
import { securityEntry } from '../securityLog'
import { hashNewPassword, isOutdated, passwordMatches } from './password'
import { userOf } from './person'
import { endSession, newSession } from './sessions'
import { createSignInDelays } from './signInDelay'

const delays = createSignInDelays()

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
  await bearDelay(email, address, now)
  const { read, write } = useDatabase()
  const [row] = await read.select().from(people).where(eq(people.email, email)).limit(1)
  const stored = row?.active ? row.passwordHash : null
  if (!await passwordMatches(stored, password) || !row || !stored) {
    await write([securityEntry({ what: 'sign-in-refused', personId: row?.id ?? null, subject: address }, now)])
    throw problem(401, 'Not signed in', 'That address and password do not go together.', undefined, { type: 'wrong-sign-in' })
  }
  delays.succeeded(email, address)
  const { sid, store } = newSession(row.id, now)
  await write([
    ...(attempt.replaces ? [endSession(attempt.replaces)] : []),
    store,
    securityEntry({ what: 'signed-in', personId: row.id, subject: address }, now),
  ])
  if (isOutdated(stored)) await renewHash(row.id, password)
  return { user: userOf(row), sid }
}

async function bearDelay(email: string, address: string, now: number): Promise<void> {
  const { wait, pause } = delays.begin(email, address, now)
  if (wait > 0) {
    const seconds = Math.ceil(wait / 1000)
    throw problem(429, 'Too many tries', `Too many tries that failed. Try again in ${seconds} s.`, undefined, {
      type: 'too-many-tries', headers: { 'Retry-After': String(seconds) },
    })
  }
  if (pause > 0) await pauseFor(pause)
}

async function renewHash(personId: string, password: string): Promise<void> {
  const passwordHash = await hashNewPassword(password)
  const { read, write } = useDatabase()
  await write([statement(read.update(people).set({ passwordHash }).where(eq(people.id, personId)))])
}
