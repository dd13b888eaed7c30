import { holdBack } from './standing'
import type { Turn } from './turn'

/** A cylinder is set apart; set apart twice it is held once, for both reasons. */
export function quarantined(turn: Turn<'quarantined'>): void {
  holdBack(turn, 'quarantined', turn.event.details.reason)
}
