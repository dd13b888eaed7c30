import { becomeUnknown, weigh } from './contents'
import { restOnNothing } from './scaleReading'
import type { Turn } from './turn'
import { putAt } from './whereabouts'

/** A firm gives a cylinder back. */
export function returned(turn: Turn<'returned'>): void {
  const { event } = turn
  comeBack(turn)
  putAt(turn, event.placeId)
  if (event.details.gross) weigh(turn, event.details.gross, 'returned-with')
}

/**
 * The cylinder is with us again. From a reclaimer, or from whom it was given to, nobody knows what it comes back with: the
 * net is unknown until it is weighed, and something may be in it until that weight is its tare.
 */
export function comeBack(turn: Turn): void {
  const { state } = turn
  const { contents } = state
  if (state.away?.at === 'at-reclaim' || state.away?.at === 'given-away') {
    becomeUnknown(turn)
    contents.shares = []
    contents.backFromReclaim = true
    const hasWeight = 'gross' in turn.event.details && turn.event.details.gross !== undefined
    // What left was booked when it went, so the books start again from nothing.
    contents.netGrams = hasWeight ? 0 : null
    contents.inStock = true
    restOnNothing(turn)
  }
  state.away = null
}
