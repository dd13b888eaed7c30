import type { Standing } from '../corrections'
import { endOf } from '../endOf'
import { afterEnd } from '../findings/record'
import type { EventKind } from '../kinds'
import type { Signature } from '../signatures'
import type { CylinderState } from '../state'
import { foldByKind } from './byKind'
import { raiseCommon } from './raiseCommon'
import { registeredAgain } from './registered'
import { stand } from './standing'
import type { FoldContext, Turn } from './turn'
import { noLongerMissing } from './whereabouts'

/** Kinds that handle no cylinder, so that they may follow its end. */
const PAPERWORK: readonly EventKind[] = ['labelled', 'corrected', 'retired', 'countersigned']
/** Kinds that leave a missing cylinder missing. */
const LEAVES_MISSING: readonly EventKind[] = ['labelled', 'missing', 'corrected', 'retired', 'countersigned']

/** What a turn takes from outside its event and the state before it. */
export interface TurnGiven {
  /** When the cylinder's first event took effect, of the registration that it begins with; else null. */
  beginsAt: number | null
  signature: Signature | null
  context: FoldContext
}

/** The turn of one event, on a copy of the state before it. */
export function takeTurn(before: CylinderState, { event, isOut }: Standing, { beginsAt, signature, context }: TurnGiven): Turn {
  const turn: Turn = {
    event, context, state: copyOf(before), at: beginsAt ?? event.effectiveAt, apart: event.practice || signature?.by === null,
    signature,
    movements: [], found: [], findings: [],
  }
  turn.state.version = Math.max(before.version, event.version)
  if (isOut) return turn
  const end = endOf(before)
  if (end !== null && !PAPERWORK.includes(event.kind)) {
    turn.findings.push(afterEnd(end.since))
    stand(turn, 'after-end')
  }
  if (!LEAVES_MISSING.includes(event.kind)) noLongerMissing(turn)
  if (event.kind === 'registered' && beginsAt === null) registeredAgain(turn as Turn<'registered'>)
  else foldByKind(turn)
  turn.state.hasHeldBurnt ||= turn.state.contents.burnt
  raiseCommon(turn, before)
  return turn
}

/** A copy that shares nothing, as JSON would make it; several times as fast. */
function copyOf<T>(value: T): T {
  if (typeof value !== 'object' || value === null) return value
  if (Array.isArray(value)) return value.map(copyOf) as T
  const copy: Record<string, unknown> = {}
  for (const key of Object.keys(value)) {
    const inner = (value as Record<string, unknown>)[key]
    if (inner !== undefined) copy[key] = copyOf(inner)
  }
  return copy as T
}
