import { holdBack } from './standing'
import type { Turn } from './turn'
import { raiseAway } from './whereabouts'

/** The outside is looked at. A damage asks for a test; a look that finds none does not make up for one. */
export function inspected(turn: Turn<'inspected'>): void {
  const { details } = turn.event
  raiseAway(turn)
  if (details.result === 'damaged') holdBack(turn, 'damaged', ...details.reasons ?? [])
}
