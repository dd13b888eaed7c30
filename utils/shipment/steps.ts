import type { ShipmentLine, ShipmentState, ShipmentWithLines } from '../contract/shipments'
import { cylinderName } from './changedLines'

/** What may be done to a shipment next. */
export type ShipmentStep = 'change' | 'ready' | 'dispatch' | 'arrive' | 'return' | 'settle' | 'close' | 'cancel'

/** What of a shipment its next step is judged by. */
export interface StepFacts {
  state: ShipmentState
  /** Whether somebody has said who carries it. */
  hasCarrier: boolean
  lines: readonly Pick<ShipmentLine, 'cylinder' | 'because' | 'weighed' | 'returnedAt'>[]
  /** What the papers still lack, a sentence each. */
  papersLack: readonly string[]
}

/** Why a step may not follow; `line` is its place in the list where it is about one. */
export interface StepReason { line: number | null, text: string }

/** What a prepared line still wants. */
export type LineWant = 'weighing' | 'weighing-again' | 'settling' | null

const FROM: Readonly<Record<ShipmentStep, readonly ShipmentState[]>> = {
  change: ['draft', 'ready'],
  ready: ['draft'],
  dispatch: ['ready'],
  arrive: ['dispatched'],
  return: ['dispatched', 'arrived'],
  settle: ['dispatched', 'arrived'],
  close: ['settled'],
  cancel: ['draft', 'ready'],
}

const STANDS: Readonly<Record<ShipmentState, string>> = {
  draft: 'It is still being prepared.',
  ready: 'It is ready, and has not left yet.',
  dispatched: 'It has left.',
  arrived: 'It has left and arrived.',
  settled: 'It is settled.',
  closed: 'It is closed.',
  cancelled: 'It was given up.',
}

/** What of a shipment as it was fetched its next step is judged by. */
export function stepFacts({ state, carrier, lines, papersLack }: ShipmentWithLines): StepFacts {
  return { state, hasCarrier: carrier !== null, lines, papersLack }
}

/** Why a step may not follow now; empty where it may. */
export function whyNot(step: ShipmentStep, facts: StepFacts): StepReason[] {
  if (!FROM[step].includes(facts.state)) return [{ line: null, text: wrongState(step, facts.state) }]
  if (step === 'ready') return notReady(facts)
  return step === 'dispatch' ? [...notReady(facts), ...facts.papersLack.map(text => ({ line: null, text }))] : []
}

/** What a line still wants before its shipment may leave; null where nothing. */
export function lineWant({ because, weighed }: Pick<ShipmentLine, 'because' | 'weighed'>): LineWant {
  if (weighed === null) return 'weighing'
  if (weighed.isStale) return 'weighing-again'
  return because.length > 0 ? 'settling' : null
}

function wrongState(step: ShipmentStep, state: ShipmentState): string {
  const isGone = state === 'dispatched' || state === 'arrived'
  if (step === 'cancel' && isGone) return `${STANDS[state]} What has left can only come back: record each cylinder as it returns.`
  if (step === 'dispatch' && state === 'draft') return 'It is not ready: each line is scanned and weighed first.'
  return STANDS[state]
}

function notReady({ hasCarrier, lines }: StepFacts): StepReason[] {
  return [
    ...(lines.length === 0 ? [{ line: null, text: 'No cylinder is on it.' }] : []),
    ...lines.flatMap((line, index) => {
      const name = cylinderName(line.cylinder)
      const want = lineWant(line)
      if (want === 'weighing') return [{ line: index, text: `${name} is not scanned and weighed yet.` }]
      if (want === 'weighing-again') return [{ line: index, text: `Something was recorded of ${name} since it was weighed. Weigh it again.` }]
      return line.because.map(({ text }) => ({ line: index, text }))
    }),
    ...(hasCarrier ? [] : [{ line: null, text: 'Nobody has said who carries it.' }]),
  ]
}
