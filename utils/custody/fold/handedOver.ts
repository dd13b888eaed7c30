import type { Turn } from './turn'
import { backByUse } from './whereabouts'

/** A cylinder passes from hand to hand, where it is. */
export function handedOver(turn: Turn<'handed-over'>): void {
  if (turn.state.away) backByUse(turn)
  turn.state.holderId = turn.event.details.toHolderId
}
