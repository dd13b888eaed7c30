import type { Standing } from '../corrections'
import type { RecordedEvent } from '../event'
import { lifecycleOf } from '../lifecycle'
import type { Movement } from '../movement'
import type { CylinderState } from '../state'
import type { StockChange } from '../stockChange'
import { labelledCode } from './labelled'
import type { FoldStep, LabelClaim, Snapshot } from './result'
import { stockChanges, heldIn, type Held } from './stock'
import { takeTurn, type TurnGiven } from './takeTurn'

/** A cylinder on its way through its events, with what those have left in the books. */
export interface Walk {
  state: CylinderState
  /** What the last event that counts left in stock; nothing before the first. */
  held: Held[]
  readonly movements: Movement[]
  readonly stockChanges: StockChange[]
  /** In the order of the walk. */
  readonly steps: FoldStep[]
}

/** Begins at a state that events have made, or at one without any. */
export function walkFrom(state: CylinderState): Walk {
  return { state, held: state.firstEventAt === null ? [] : heldIn(state), movements: [], stockChanges: [], steps: [] }
}

/** Goes on by one event. */
export function walkOn(walk: Walk, standing: Standing, given: TurnGiven): void {
  const turn = takeTurn(walk.state, standing, given)
  walk.steps.push({
    eventId: standing.event.id,
    before: snapshot(walk.state),
    after: snapshot(turn.state),
    findings: turn.findings,
    movements: turn.movements,
    correction: standing.correction,
    signature: given.signature,
  })
  walk.movements.push(...turn.movements)
  if (!standing.isOut) {
    const before = walk.held
    walk.held = heldIn(turn.state)
    walk.stockChanges.push(...stockChanges(before, walk.held, turn))
  }
  walk.state = turn.state
}

/** The label codes that events claim, those left out that were taken out. */
export function labelClaimsOf(standings: readonly Standing[]): LabelClaim[] {
  return standings.flatMap(({ event, isOut }) => {
    if (event.kind !== 'labelled' || isOut) return []
    const { id, effectiveAt, deviceId, deviceSeq } = event
    return [{ eventId: id, code: labelledCode((event as RecordedEvent<'labelled'>).details), effectiveAt, deviceId, deviceSeq }]
  })
}

function snapshot(state: CylinderState): Snapshot {
  const { netGrams, inStock, refrigerant, condition } = state.contents
  return { netGrams, inStock, refrigerant, condition, placeId: state.placeId, holderId: state.holderId, lifecycle: lifecycleOf(state) }
}
