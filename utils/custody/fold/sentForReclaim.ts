import { weigh } from './contents'
import { leaveStock } from './ledger'
import type { Turn } from './turn'
import { backByUse, putAt } from './whereabouts'

/** A cylinder leaves for a reclaimer: weighed as it goes, then out of stock. */
export function sentForReclaim(turn: Turn<'sent-for-reclaim'>): void {
  const { state, event } = turn
  if (state.away) backByUse(turn)
  weigh(turn, event.details.gross, 'weighing')
  leaveStock(turn)
  state.away = { at: 'at-reclaim', since: event.effectiveAt, listId: event.details.shipmentId }
  putAt(turn, event.placeId)
}
