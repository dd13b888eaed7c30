import type { Turn } from './turn'
import { backByUse, putAt } from './whereabouts'

/** A cylinder leaves for its requalification, with what is in it. */
export function sentForTest(turn: Turn<'sent-for-test'>): void {
  const { state, event } = turn
  if (state.away) backByUse(turn)
  state.away = { at: 'at-test', since: event.effectiveAt, listId: event.details.lotId }
  putAt(turn, event.placeId)
}
