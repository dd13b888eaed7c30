import type { User } from '~~/utils/contract/session'

const KEY = 'collarbook-person'

/** Who was last signed in on this device: nothing that opens the server, and of nobody else. Null where nobody is. */
export function keptPerson(): User | null {
  try {
    const kept = JSON.parse(localStorage.getItem(KEY) ?? 'null') as Partial<User> | null
    return typeof kept?.id === 'string' && Array.isArray(kept.roles) ? kept as User : null
  }
  catch {
    return null
  }
}

/** Keeps who is signed in, or forgets it by null. */
export function keepPerson(person: User | null) {
  try {
    if (person) localStorage.setItem(KEY, JSON.stringify(person))
    else localStorage.removeItem(KEY)
  }
  catch {
    // A browser that stores nothing opens nothing without the server either.
  }
}
