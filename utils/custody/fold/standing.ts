import type { StandingCode, StateHold } from '../state'
import type { Turn } from './turn'

/** A finding stands from this event on; one that stands already keeps its beginning. */
export function stand(turn: Turn, code: StandingCode): void {
  const { standing } = turn.state
  if (!standing.some(one => one.code === code)) standing.push({ code, since: turn.event.effectiveAt })
}

/** Findings stand no longer. */
export function endStanding(turn: Turn, ...codes: StandingCode[]): void {
  turn.state.standing = turn.state.standing.filter(({ code }) => !codes.includes(code))
}

/** Puts a hold on the cylinder; one that is on already keeps its beginning. */
export function holdBack(turn: Turn, hold: StateHold): void {
  const { holds } = turn.state
  if (!holds.some(one => one.hold === hold)) holds.push({ hold, since: turn.event.effectiveAt })
}

/** Lifts holds. */
export function lift(turn: Turn, ...holds: StateHold[]): void {
  turn.state.holds = turn.state.holds.filter(({ hold }) => !holds.includes(hold))
}
