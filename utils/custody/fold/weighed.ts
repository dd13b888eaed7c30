import { weigh } from './contents'
import type { Turn } from './turn'
import { backByUse } from './whereabouts'

/** A cylinder stands on a scale. */
export function weighed(turn: Turn<'weighed'>): void {
  if (turn.state.away) backByUse(turn)
  weigh(turn, turn.event.details.gross, 'weighing', turn.event.details.scaleId)
}
