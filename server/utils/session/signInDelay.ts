const MINUTE = 60_000
const FORGOTTEN_AFTER = 15 * MINUTE
const LONGEST_WAIT = MINUTE
const LONGEST_PAUSE = 5_000
const MOST_KEYS = 10_000

/** Failures that cost nothing: for one person from one address, for one address, for one person from anywhere. */
const FREE = { pair: 5, address: 25, person: 10 }

interface Failures { count: number, last: number }

/** What a try to sign in has to bear. Units: milliseconds. */
export interface SignInDelay {
  /** Refuse until this has passed; 0: go on. */
  wait: number
  /** Answer only after this. */
  pause: number
}

/**
 * Slows down guessing. An address that fails has to wait, up to a minute; tries at one person from many addresses are
 * answered slowly but never refused, so that nobody can lock another out. Kept in memory, bounded, forgotten after
 * a quarter of an hour without failures.
 */
export function createSignInDelays(mostKeys = MOST_KEYS) {
  const failures = new Map<string, Failures>()

  function countOf(key: string, now: number): Failures {
    const known = failures.get(key)
    return known && now - known.last < FORGOTTEN_AFTER ? known : { count: 0, last: 0 }
  }

  function waitFor(key: string, free: number, now: number): number {
    const { count, last } = countOf(key, now)
    if (count < free) return 0
    return Math.max(0, last + Math.min(LONGEST_WAIT, 1000 * 2 ** (count - free)) - now)
  }

  function add(key: string, now: number): void {
    const { count } = countOf(key, now)
    // Put at the end: the one that failed longest ago is dropped first.
    failures.delete(key)
    failures.set(key, { count: count + 1, last: now })
    if (failures.size > mostKeys) failures.delete(failures.keys().next().value as string)
  }

  function takeBack(key: string): void {
    const known = failures.get(key)
    if (known && known.count > 1) failures.set(key, { ...known, count: known.count - 1 })
    else failures.delete(key)
  }

  return {
    /** Counts a try as failed until it has succeeded, so that many at once count as many. One that must wait is not counted. */
    begin(email: string, address: string, now: number): SignInDelay {
      const wait = Math.max(waitFor(pairKey(email, address), FREE.pair, now), waitFor(addressKey(address), FREE.address, now))
      const { count } = countOf(personKey(email), now)
      if (wait > 0) return { wait, pause: 0 }
      for (const key of [pairKey(email, address), addressKey(address), personKey(email)]) add(key, now)
      return { wait, pause: count < FREE.person ? 0 : Math.min(LONGEST_PAUSE, 250 * 2 ** (count - FREE.person)) }
    },
    /** Clears what stands against the person; of the address only this try, or one good account would free it. */
    succeeded(email: string, address: string): void {
      failures.delete(pairKey(email, address))
      failures.delete(personKey(email))
      takeBack(addressKey(address))
    },
  }
}

function pairKey(email: string, address: string): string {
  return `pair ${address} ${email}`
}

function addressKey(address: string): string {
  return `address ${address}`
}

function personKey(email: string): string {
  return `person ${email}`
}
