import { loseNet, weighAfterOutflow } from './contents'
import { holdBack } from './standing'
import type { Turn } from './turn'
import { raiseAway } from './whereabouts'

/** Refrigerant escapes; after a leak or an accident the cylinder itself is in doubt. */
export function lost(turn: Turn<'lost'>): void {
  const { contents } = turn.state
  const { grossAfter, cause } = turn.event.details
  raiseAway(turn)
  if (grossAfter) weighAfterOutflow(turn, grossAfter, 'lost')
  else if (!contents.nothingInIt) loseNet(turn, 'lost')
  // What lets gas out lets air in.
  contents.evacuated = false
  if (cause === 'leak' || cause === 'accident') holdBack(turn, 'damaged', cause)
}
