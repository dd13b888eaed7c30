import type { Turn } from './turn'
import { backByUse, putAt } from './whereabouts'

/** The cylinder is there again; found at another place than it was sent to, it is back from there as well. */
export function found(turn: Turn<'found'>): void {
  const { state, event } = turn
  const { placeId } = event.details
  if (placeId === undefined || placeId === state.placeId) return
  if (state.away) backByUse(turn)
  putAt(turn, placeId)
}
