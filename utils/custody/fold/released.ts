import { lift } from './standing'
import type { Turn } from './turn'

/** A cylinder is set apart no longer. What else holds it back stays: only a test or a deep vacuum lifts that. */
export function released(turn: Turn<'released'>): void {
  lift(turn, 'quarantined')
}
