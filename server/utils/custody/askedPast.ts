import { pastIn } from '../../../utils/contract/past'
import type { Past } from '../../../utils/custody/asItStood'
import { impossible } from '../http/impossible'

/** The past that a query asks for; null where it asks for the present. Errors: 422 for an instant still to come. */
export function askedPast(query: { asOf?: string, knownAt?: string }, nowMs: number): Past | null {
  const past = pastIn(query)
  for (const name of ['asOf', 'knownAt'] as const) {
    if (past !== null && (past[name] ?? 0) > nowMs) throw impossible(name, 'must not be still to come')
  }
  return past
}
