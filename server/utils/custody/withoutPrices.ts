import { can } from '../../../utils/access/permissions'
import type { Access } from '../../../utils/access/roles'

const PRICES: ReadonlySet<string> = new Set(['price', 'pricePer'])
/** What says a price, and what may put another in its place. */
const SAYS_PRICES: ReadonlySet<string> = new Set(['reclaimed', 'corrected'])

/** Entries of the log as a person may read them: without what a reclaimer paid, where that is not theirs to know. */
export function withoutPrices<T extends { kind: string }>(entries: readonly T[], access: Access): T[] {
  if (can(access, 'terms:read')) return [...entries]
  return entries.map(entry => SAYS_PRICES.has(entry.kind) ? bare(entry) : entry)
}

function bare<T>(entry: T): T {
  return JSON.parse(JSON.stringify(entry, (key, value: unknown) => PRICES.has(key) ? undefined : value)) as T
}
