import { problem } from '../http/problem'
import { createHashQueue, TooManyHashes } from './hashQueue'
import { newSecret } from './secret'

// hashPassword, verifyPassword and passwordNeedsReHash are nuxt-auth-utils'; it gives them as auto-imports only.

/** One hash takes 128 MiB and most of a second of one core (scrypt, N = 2^17, r = 8, p = 1). */
const inTurn = createHashQueue({ atOnce: 2, mostWaiting: 16 })

let dummy: Promise<string> | null = null

/** The hash of a password, with its salt and cost in it (PHC string). */
export function hashNewPassword(password: string): Promise<string> {
  return queued(() => hashPassword(normalised(password)))
}

/**
 * Whether a password is the one of a stored hash. Without a stored hash just as much work is done, so that the time
 * does not tell whether there is one.
 */
export async function passwordMatches(stored: string | null, password: string): Promise<boolean> {
  const against = stored ?? await dummyHash()
  const matches = await queued(() => verifyPassword(against, normalised(password)))
  return stored !== null && matches
}

/** Whether a stored hash was made at another cost than today's. */
export function isOutdated(stored: string): boolean {
  return passwordNeedsReHash(stored)
}

/** Made at start, so that the first unknown person takes no longer than others. */
export function dummyHash(): Promise<string> {
  dummy ??= hashPassword(newSecret())
  return dummy
}

/** The same characters typed on another keyboard are the same password. */
function normalised(password: string): string {
  return password.normalize('NFKC')
}

async function queued<T>(job: () => Promise<T>): Promise<T> {
  try {
    return await inTurn(job)
  }
  catch (error) {
    if (!(error instanceof TooManyHashes)) throw error
    throw problem(429, 'Too many at once', 'Too many people are signing in at once. Try again in a few seconds.', undefined, { headers: { 'Retry-After': '5' } })
  }
}
