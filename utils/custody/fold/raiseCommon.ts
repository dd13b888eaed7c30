import { clockDoubtful } from '../findings/record'
import { standingFinding } from '../findings/standing'
import { overfill } from '../findings/weight'
import { judgedLimitGrams, judgedNetGrams, overfillGrams } from '../judgedLimit'
import { unclampedTime } from '../order'
import { STANDING_CODES, type CylinderState } from '../state'
import { stand } from './standing'
import type { Turn } from './turn'

/** Raises what may follow from an event of any kind: of its clock, its author, its weight, and what now begins to stand. */
export function raiseCommon(turn: Turn, before: CylinderState): void {
  raiseClock(turn)
  raiseTrainee(turn)
  raiseOverfill(turn, before)
  raiseStanding(turn, before)
}

/** A clock that is off by more is not to be trusted. Units: seconds. */
export const DOUBTFUL_SKEW_S = 300
/** A clock that is off by less counts as right, so a time held back by less raises no doubt. */
export const DOUBTFUL_CLAMP_MS = 60_000

function raiseClock({ event, findings }: Turn): void {
  const clamped = unclampedTime(event) - event.effectiveAt >= DOUBTFUL_CLAMP_MS
  if (clamped || Math.abs(event.clockSkewSeconds) > DOUBTFUL_SKEW_S) findings.push(clockDoubtful(clamped))
}

function raiseTrainee(turn: Turn): void {
  const { event, signature } = turn
  if (signature === null || signature.by !== null) return
  stand(turn, 'unsigned')
  // Who names themselves had nobody.
  const supervisorId = event.supervisorId === event.actorId ? null : event.supervisorId
  if (supervisorId === null) stand(turn, 'unsupervised')
  else turn.state.waitsForSignatureOf = [...new Set([...turn.state.waitsForSignatureOf, supervisorId])]
}

function raiseOverfill(turn: Turn, before: CylinderState): void {
  const { state, context, event, findings } = turn
  const limit = judgedLimitGrams(state, context.policyAt(event.effectiveAt), context.policyAt, context.catalogue)
  const excess = overfillGrams(state, limit)
  if (excess === 0) {
    state.overfilledAt = null
    return
  }
  state.overfilledAt ??= event.effectiveAt
  const isWeighedNow = state.contents.asOf === event.effectiveAt && state.contents.netGrams !== before.contents.netGrams
  if (before.overfilledAt === null || isWeighedNow) {
    findings.push(overfill(excess, state.contents.netGrams === null && judgedNetGrams(state) !== null, state.overfilledAt))
  }
}

/** Findings that begin to stand with this event show on its line too. */
function raiseStanding({ state, findings }: Turn, before: CylinderState): void {
  for (const code of STANDING_CODES) {
    const standing = state.standing.find(one => one.code === code)
    if (!standing || code === 'after-end' || before.standing.some(one => one.code === code)) continue
    findings.push(standingFinding(standing))
  }
}
