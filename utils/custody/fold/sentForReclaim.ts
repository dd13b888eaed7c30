import { weigh } from './contents'
import { leaveStock } from './ledger'
import { readScale } from './scaleReading'
import type { Turn } from './turn'
import { backByUse, putAt } from './whereabouts'

/** A cylinder leaves for a reclaimer: weighed as it goes, then out of stock. */
export function sentForReclaim(turn: Turn<'sent-for-reclaim'>): void {
  const { state, event } = turn
  if (state.away) backByUse(turn)
  // A reading that tells no net cannot be set against the log: what was known of it is what left.
  const isReadable = readScale(turn, event.details.gross).netGrams !== null
  weigh(turn, event.details.gross, isReadable ? 'weighing' : 'shipped')
  leaveStock(turn, 'shipped')
  state.away = { at: 'at-reclaim', since: event.effectiveAt, listId: event.details.shipmentId }
  putAt(turn, event.placeId)
}
