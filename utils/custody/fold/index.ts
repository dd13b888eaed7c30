import { applyCorrections, type Standing } from '../corrections'
import type { AnyRecordedEvent } from '../event'
import { needsSignature, signaturesOf, type Signature } from '../signatures'
import { initialState, type CylinderState } from '../state'
import { withLastEvent } from './lastEvent'
import { namedEarly } from './namedEarly'
import type { FoldResult } from './result'
import type { FoldContext } from './turn'
import { labelClaimsOf, walkFrom, walkOn } from './walk'

export type { FoldResult, FoldStep, LabelClaim, Snapshot } from './result'
export type { FoldContext } from './turn'

/**
 * One cylinder from its events, in whatever order they arrived.
 *
 * Nothing is refused: an event that breaks a rule counts, with a finding. The first registration in effect is the
 * beginning, whatever its time; an event that a correction took out counts for nothing but its line in the log.
 * The movements of a step are exactly its change of what is in stock.
 *
 * @param until leaves out what took effect later (UTC milliseconds). Corrections count whenever they were made.
 */
export function fold(events: readonly AnyRecordedEvent[], context: FoldContext, until = Infinity): FoldResult {
  const standings = inEffectBy(until, applyCorrections(events))
  const beginning = beginningOf(standings)
  const inTurn = beginning ? [beginning, ...standings.filter(standing => standing !== beginning)] : standings
  const signatures = signaturesOf(standings)
  const walk = walkFrom(initialState(events[0]?.cylinderId ?? ''))
  for (const standing of inTurn) {
    walkOn(walk, standing, { beginsAt: standing === beginning ? firstAt(standings) : null, signature: signatureOn(standing, signatures), context })
  }
  const stepOf = new Map(walk.steps.map(step => [step.eventId, step]))
  return {
    state: ended(walk.state, standings.filter(({ event }) => event.effectiveAt <= until), events),
    movements: walk.movements,
    stockChanges: walk.stockChanges,
    steps: standings.flatMap(({ event }) => stepOf.get(event.id) ?? []),
    labelClaims: labelClaimsOf(standings),
  }
}

/** What had taken effect by an instant; the registration is the beginning, and so it had once anything had happened. */
function inEffectBy(until: number, standings: Standing[]): Standing[] {
  if (until === Infinity) return standings
  const beginning = beginningOf(standings)
  const hasBegun = standings.some(({ event, isOut }) => event.effectiveAt <= until && !isOut)
  return standings.filter(standing => standing.event.effectiveAt <= until || (standing === beginning && hasBegun))
}

function beginningOf(standings: readonly Standing[]): Standing | undefined {
  return standings.find(({ event, isOut }) => event.kind === 'registered' && !isOut)
}

function signatureOn({ event, isOut }: Standing, signatures: ReadonlyMap<string, string>): Signature | null {
  return isOut || !needsSignature(event) ? null : { by: signatures.get(event.id) ?? null }
}

function firstAt(standings: readonly Standing[]): number | null {
  return standings.find(({ isOut }) => !isOut)?.event.effectiveAt ?? null
}

function ended(state: CylinderState, standings: readonly Standing[], events: readonly AnyRecordedEvent[]): CylinderState {
  const counting = standings.filter(({ isOut }) => !isOut).map(({ event }) => event)
  return { ...withLastEvent(state, counting, state), latestAt: standings.at(-1)?.event.effectiveAt ?? null, namedEarly: namedEarly(events) }
}
