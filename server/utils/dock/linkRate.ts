/** What one link may ask at once, and how much of it comes back each second: a dock of several phones needs less. */
const MOST_AT_ONCE = 120
const BACK_EACH_SECOND = 2
const MOST_LINKS = 1_000

/**
 * How much each link asks, in memory and bounded.
 *
 * Shape: answers the seconds to wait, 0 where it may go on.
 */
export function createLinkRate() {
  const left = new Map<string, { count: number, at: number }>()
  return (linkId: string, now: number): number => {
    const before = left.get(linkId) ?? { count: MOST_AT_ONCE, at: now }
    const count = Math.min(MOST_AT_ONCE, before.count + Math.max(0, now - before.at) / 1000 * BACK_EACH_SECOND)
    // Put at the end: the one that asked longest ago is dropped first.
    left.delete(linkId)
    left.set(linkId, { count: count < 1 ? count : count - 1, at: now })
    if (left.size > MOST_LINKS) left.delete(left.keys().next().value!)
    return count < 1 ? Math.ceil((1 - count) / BACK_EACH_SECOND) : 0
  }
}
