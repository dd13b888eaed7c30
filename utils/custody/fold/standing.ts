import type { Hold } from '../cylinderView'
import type { StandingCode } from '../state'
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

/** Puts a hold on the cylinder; one that is on already keeps its beginning, and takes the reasons that are new. */
export function holdBack(turn: Turn, hold: Hold, ...reasons: string[]): void {
  const { holds } = turn.state
  const known = holds.find(one => one.hold === hold)
  if (known) known.reasons.push(...reasons.filter(reason => !known.reasons.includes(reason)))
  else holds.push({ hold, since: turn.event.effectiveAt, reasons })
}

/** Lifts holds. */
export function lift(turn: Turn, ...holds: Hold[]): void {
  turn.state.holds = turn.state.holds.filter(({ hold }) => !holds.includes(hold))
}
