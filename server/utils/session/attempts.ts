import { setTimeout as pauseFor } from 'node:timers/promises'
import { problem } from '../http/problem'
import { createSignInDelays } from './signInDelay'

const delays = createSignInDelays()

/**
 * Begins a try at a person's password, which counts as failed until {@link attemptSucceeded}.
 *
 * Errors: 429 where it has to wait.
 */
export async function beginAttempt(email: string, address: string, now: number): Promise<void> {
  const { wait, pause } = delays.begin(email, address, now)
  if (wait > 0) {
    const seconds = Math.ceil(wait / 1000)
    throw problem(429, 'Too many tries', `Too many tries that failed. Try again in ${seconds} s.`, undefined, {
      type: 'too-many-tries', headers: { 'Retry-After': String(seconds) },
    })
  }
  if (pause > 0) await pauseFor(pause)
}

/** The password was right: the failures before it no longer count. */
export function attemptSucceeded(email: string, address: string): void {
  delays.succeeded(email, address)
}
