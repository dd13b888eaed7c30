import type { Lifecycle } from '../cylinderView'
import { endOf } from '../endOf'
import { applyCorrections, type Correction, type Standing } from '../corrections'
import type { AnyRecordedEvent, RecordedEvent } from '../event'
import type { Finding } from '../finding'
import { afterEnd } from '../findings/record'
import type { EventKind } from '../kinds'
import { lifecycleOf } from '../lifecycle'
import type { Movement } from '../movement'
import { needsSignature, signaturesOf, type Signature } from '../signatures'
import { initialState, type CylinderState } from '../state'
import type { StockChange } from '../stockChange'
import { checked } from './checked'
import { corrected } from './corrected'
import { countersigned } from './countersigned'
import { drawn } from './drawn'
import { emptied } from './emptied'
import { exchanged } from './exchanged'
import { filled } from './filled'
import { found } from './found'
import { handedOver } from './handedOver'
import { inspected } from './inspected'
import { raiseCommon } from './raiseCommon'
import { labelled, labelledCode } from './labelled'
import { lost } from './lost'
import { missing } from './missing'
import { moved } from './moved'
import { quarantined } from './quarantined'
import { received } from './received'
import { reclaimed } from './reclaimed'
import { registered, registeredAgain } from './registered'
import { released } from './released'
import { retested } from './retested'
import { retired } from './retired'
import { returned } from './returned'
import { sentForReclaim } from './sentForReclaim'
import { sentForTest } from './sentForTest'
import { stand } from './standing'
import { heldIn, stockChanges, type Held } from './stock'
import { transferred } from './transferred'
import type { FoldContext, Turn } from './turn'
import { weighed } from './weighed'
import { noLongerMissing } from './whereabouts'

export type { FoldContext } from './turn'

/** How the cylinder stood before or after one event. */
export interface Snapshot {
  netGrams: number | null
  inStock: boolean
  refrigerant: string | null
  condition: CylinderState['contents']['condition']
  placeId: string | null
  holderId: string | null
  lifecycle: Lifecycle
}

/** What one event did. */
export interface FoldStep {
  eventId: string
  before: Snapshot
  after: Snapshot
  findings: Finding[]
  movements: Movement[]
  correction: Correction | null
  /** null where it needs none. */
  signature: Signature | null
}

/** A label code that an event of this cylinder claims. */
export interface LabelClaim { eventId: string, code: string, effectiveAt: number, deviceId: string, deviceSeq: number }

/** A cylinder as its events have made it, and what each of them did. */
export interface FoldResult {
  state: CylinderState
  movements: Movement[]
  stockChanges: StockChange[]
  /** In order of effect. */
  steps: FoldStep[]
  labelClaims: LabelClaim[]
}

/** What each kind does to a cylinder. */
const FOLDS: { [K in EventKind]: (turn: Turn<K>) => void } = {
  'registered': registered,
  'labelled': labelled,
  'received': received,
  'moved': moved,
  'handed-over': handedOver,
  'weighed': weighed,
  'filled': filled,
  'drawn': drawn,
  'transferred': transferred,
  'checked': checked,
  'emptied': emptied,
  'lost': lost,
  'inspected': inspected,
  'quarantined': quarantined,
  'released': released,
  'missing': missing,
  'found': found,
  'retired': retired,
  'sent-for-reclaim': sentForReclaim,
  'reclaimed': reclaimed,
  'returned': returned,
  'exchanged': exchanged,
  'sent-for-test': sentForTest,
  'retested': retested,
  'corrected': corrected,
  'countersigned': countersigned,
}

/** Kinds that say nothing of where the cylinder is. */
const UNSEEN: readonly EventKind[] = ['labelled', 'corrected', 'reclaimed', 'missing', 'countersigned']
/** Kinds that handle no cylinder, so that they may follow its end. */
const PAPERWORK: readonly EventKind[] = ['labelled', 'corrected', 'retired', 'countersigned']
/** Kinds that leave a missing cylinder missing. */
const LEAVES_MISSING: readonly EventKind[] = ['labelled', 'missing', 'corrected', 'retired', 'countersigned']

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
  const beginning = standings.find(({ event, isOut }) => event.kind === 'registered' && !isOut)
  const inTurn = beginning ? [beginning, ...standings.filter(standing => standing !== beginning)] : standings
  let state = initialState(events[0]?.cylinderId ?? '')
  const signatures = signaturesOf(standings)
  const stepOf = new Map<string, FoldStep>()
  const movements: Movement[] = []
  const stock: StockChange[] = []
  let held: Held[] = []
  for (const standing of inTurn) {
    const signature = signatureOn(standing, signatures)
    const turn = takeTurn(state, standing, { beginsAt: standing === beginning ? firstAt(standings) : null, signature, context })
    stepOf.set(standing.event.id, {
      eventId: standing.event.id,
      before: snapshot(state),
      after: snapshot(turn.state),
      findings: turn.findings,
      movements: turn.movements,
      correction: standing.correction,
      signature,
    })
    movements.push(...turn.movements)
    if (!standing.isOut) {
      const before = held
      held = heldIn(turn.state)
      stock.push(...stockChanges(before, held, turn))
    }
    state = turn.state
  }
  return {
    state: withLastEvent(state, standings.filter(({ event }) => event.effectiveAt <= until)),
    movements,
    stockChanges: stock,
    steps: standings.flatMap(({ event }) => stepOf.get(event.id) ?? []),
    labelClaims: standings.flatMap(labelClaim),
  }
}

/** What had taken effect by an instant; the registration is the beginning, and so it had once anything had happened. */
function inEffectBy(until: number, standings: Standing[]): Standing[] {
  if (until === Infinity) return standings
  const beginning = standings.find(({ event, isOut }) => event.kind === 'registered' && !isOut)
  const hasBegun = standings.some(({ event, isOut }) => event.effectiveAt <= until && !isOut)
  return standings.filter(standing => standing.event.effectiveAt <= until || (standing === beginning && hasBegun))
}

/** @param beginsAt when the cylinder's first event took effect, of the registration that it begins with; else null. */
function takeTurn(
  before: CylinderState, { event, isOut }: Standing,
  { beginsAt, signature, context }: { beginsAt: number | null, signature: Signature | null, context: FoldContext },
): Turn {
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

function signatureOn({ event, isOut }: Standing, signatures: ReadonlyMap<string, string>): Signature | null {
  return isOut || !needsSignature(event) ? null : { by: signatures.get(event.id) ?? null }
}

function firstAt(standings: readonly Standing[]): number | null {
  return standings.find(({ isOut }) => !isOut)?.event.effectiveAt ?? null
}

function foldByKind<K extends EventKind>(turn: Turn<K>): void {
  // The kind of the event names the fold that takes it, which the compiler cannot follow.
  const foldKind = FOLDS[turn.event.kind] as ((turn: Turn<K>) => void) | undefined
  foldKind?.(turn)
}

function withLastEvent(state: CylinderState, standings: readonly Standing[]): CylinderState {
  const counting = standings.filter(({ isOut }) => !isOut).map(({ event }) => event)
  const last = counting.at(-1)
  const seen = counting.findLast(event => !UNSEEN.includes(event.kind))
  return {
    ...state,
    firstEventAt: counting[0]?.effectiveAt ?? null,
    lastEventAt: last?.effectiveAt ?? null,
    lastEventKind: last?.kind ?? null,
    // What was given away is no longer ours to look for.
    lastSeenAt: state.away?.at === 'given-away' ? null : seen?.effectiveAt ?? null,
  }
}

function labelClaim({ event, isOut }: Standing): LabelClaim[] {
  if (event.kind !== 'labelled' || isOut) return []
  const { id, effectiveAt, deviceId, deviceSeq } = event
  return [{ eventId: id, code: labelledCode((event as RecordedEvent<'labelled'>).details), effectiveAt, deviceId, deviceSeq }]
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

function snapshot(state: CylinderState): Snapshot {
  const { netGrams, inStock, refrigerant, condition } = state.contents
  return { netGrams, inStock, refrigerant, condition, placeId: state.placeId, holderId: state.holderId, lifecycle: lifecycleOf(state) }
}
