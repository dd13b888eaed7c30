import type { Turn } from './turn'
import { backByUse, putAt } from './whereabouts'

/** A cylinder goes to another place. */
export function moved(turn: Turn<'moved'>): void {
  if (turn.state.away) backByUse(turn)
  putAt(turn, turn.event.details.toPlaceId, turn.event.details.toHolderId)
}
