import { away, foundByUse } from '../findings/record'
import { enterStock } from './ledger'
import type { Turn } from './turn'

/** The cylinder is at a place, and nobody carries it unless that is said. */
export function putAt(turn: Turn, placeId: string | null, holderId: string | null = null): void {
  turn.state.placeId = placeId
  turn.state.holderId = holderId
}

/** A missing cylinder is there again: because somebody says so, or because something was done with it. */
export function noLongerMissing(turn: Turn): void {
  const { state, event } = turn
  if (!state.missing) return
  if (event.kind !== 'found') turn.findings.push(foundByUse(state.missing.since))
  state.missing = null
}

/** Something was done with a cylinder that should have been away: it is back, with what it left with. */
export function backByUse(turn: Turn): void {
  raiseAway(turn)
  enterStock(turn)
  turn.state.away = null
}

/** Something happened to a cylinder while it is away; it stays so. */
export function raiseAway(turn: Turn): void {
  const { away: where } = turn.state
  if (where) turn.findings.push(away(where.at, where.since))
}
