import type { PairBalance } from '../contract/plans'
import { pairFindings } from '../custody/findings/pairs'
import { withOtherHalf, type Half } from '../custody/half'

/** How a transfer stands by both its halves, as its findings would say it; null where the event is none of these halves. */
export function pairBalance(eventId: string, mine: readonly Half[], others: readonly Half[]): { grams: number | null, balance: PairBalance } | null {
  const pair = withOtherHalf(mine, others).find(({ half }) => half.eventId === eventId)
  if (pair === undefined) return null
  const grams = pair.half.transfer?.grams ?? null
  const codes = pairFindings([pair.half], pair.other === null ? [] : [pair.other]).map(({ code }) => code)
  if (codes.includes('half-transfer')) return { grams, balance: 'half' }
  if (codes.includes('transfer-unbalanced')) return { grams, balance: 'unbalanced' }
  return { grams, balance: grams === null || pair.other?.transfer?.grams == null ? 'not-known' : 'balanced' }
}
