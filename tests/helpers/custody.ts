import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { AnyRecordedEvent } from '~~/utils/custody/event'
import type { CylinderView } from '~~/utils/custody/cylinderView'
import type { FindingCode } from '~~/utils/custody/finding'
import { fold, type FoldContext, type FoldResult } from '~~/utils/custody/fold'
import type { EventKind } from '~~/utils/custody/kinds'
import type { DetailsOf } from '~~/utils/custody/schema'
import { NOTHING_SAID } from '~~/utils/custody/saidByOthers'
import { view, type ViewContext } from '~~/utils/custody/view'
import type { MassReading } from '~~/utils/quantity/mass'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'

export const HOUR = 3_600_000
export const DAY = 24 * HOUR
/** Noon in Chicago on 1 July 2026, when the stories of these tests begin. */
export const START = Date.UTC(2026, 6, 1, 17)

export const CYLINDER = '0198f000-0000-7000-8000-0000000000c1'
export const OTHER_CYLINDER = '0198f000-0000-7000-8000-0000000000c2'
export const SHOP = '0198f000-0000-7000-8000-0000000000a1'
export const VAN = '0198f000-0000-7000-8000-0000000000a2'
export const RECLAIMER_PLACE = '0198f000-0000-7000-8000-0000000000a3'
export const TEST_PLACE = '0198f000-0000-7000-8000-0000000000a4'
export const SUPPLIER_PLACE = '0198f000-0000-7000-8000-0000000000a5'
export const TECHNICIAN = '0198f000-0000-7000-8000-0000000000b1'
export const SUPERVISOR = '0198f000-0000-7000-8000-0000000000b2'
export const CUSTOMER = '0198f000-0000-7000-8000-0000000000f1'
export const SUPPLIER = '0198f000-0000-7000-8000-0000000000f2'
export const REQUALIFIER = '0198f000-0000-7000-8000-0000000000f3'
export const SHIPMENT = '0198f000-0000-7000-8000-0000000000e1'
export const LOT = '0198f000-0000-7000-8000-0000000000e2'

/** A reading in kilograms, so that grams can be reckoned in the head. */
export function kg(value: number): MassReading {
  return { unit: 'kg', value }
}

/**
 * A cylinder whose limits are round numbers: tare 12.00 kg, water capacity 20.00 kg, so the water weight rule gives
 * R-22 exactly 16,000 g and a stop weight of 28,000 g. At a gross of 12 kg the default scale is good to 60 g.
 */
export const STAMP = {
  serial: 'A1001',
  spec: 'DOT-4BA',
  servicePressurePsig: 400,
  tareWeight: kg(12),
  waterCapacity: kg(20),
  madeMonth: '2024-03',
  flammableMarked: true,
} as const

/** What happened, without when. */
export interface Told {
  kind: EventKind
  details: object
  more: Partial<Pick<AnyRecordedEvent,
  'id' | 'deviceId' | 'deviceSeq' | 'clockSkewSeconds' | 'occurredAt' | 'effectiveAt' | 'recordedAt' | 'actorId' | 'supervisorId'
  | 'trainee' | 'placeId' | 'practice' | 'confirmed'>>
}

/** Something that happened; `more.occurredAt` sets its time, else each event is an hour after the one told before it. */
export function did<K extends EventKind>(kind: K, details: DetailsOf<K>, more: Told['more'] = {}): Told {
  return { kind, details, more }
}

export function registered(details: Partial<DetailsOf<'registered'>> = {}, more: Told['more'] = {}): Told {
  return did('registered', { stamp: STAMP, ownership: 'own', contents: 'evacuated', ...details }, { placeId: SHOP, ...more })
}

/** A fill whose outside was looked at. */
export function filled(refrigerant: string | null, grossAfterKg: number, details: Partial<DetailsOf<'filled'>> = {}, more: Told['more'] = {}): Told {
  return did('filled', { refrigerant, grossAfter: kg(grossAfterKg), looked: true, ...details }, more)
}

export function weighed(grossKg: number, more: Told['more'] = {}): Told {
  return did('weighed', { gross: kg(grossKg) }, more)
}

export function corrected(eventId: string, instead?: object, more: Told['more'] = {}): Told {
  return did('corrected', { eventId, reason: 'a slip of the pen', ...(instead ? { instead: instead as Record<string, unknown> } : {}) }, more)
}

/** The id of the nth event told, from 0. */
export function idOf(index: number): string {
  return `0198f000-0000-7000-9000-${String(index).padStart(12, '0')}`
}

/** The events of a story as the log would hold them, recorded as they happened. */
export function recorded(...story: Told[]): AnyRecordedEvent[] {
  return story.map(({ kind, details, more }, index) => {
    const occurredAt = more.occurredAt ?? START + index * HOUR
    const recordedAt = more.recordedAt ?? Math.max(occurredAt, START + index * HOUR)
    return {
      seq: index + 1,
      id: idOf(index),
      cylinderId: CYLINDER,
      version: index + 1,
      kind,
      occurredOffsetMinutes: -300,
      clockSkewSeconds: 0,
      effectiveAt: Math.min(occurredAt - (more.clockSkewSeconds ?? 0) * 1000, recordedAt),
      deviceId: 'phone-1',
      deviceSeq: index,
      actorId: TECHNICIAN,
      postedBy: TECHNICIAN,
      supervisorId: null,
      trainee: false,
      placeId: null,
      note: null,
      practice: false,
      confirmed: [],
      details,
      ...more,
      occurredAt,
      recordedAt,
    } as AnyRecordedEvent
  })
}

export const FOLD_CONTEXT: FoldContext = {
  scales: new Map(),
  catalogue: CATALOGUE,
  policyAt: () => DEFAULT_FILL_POLICY,
  timeZone: 'America/Chicago',
  retestAt: () => ({ intervalMonths: null, ownerChoices: [] }),
  placeOfFirm: firmId => firmId === SUPPLIER ? SUPPLIER_PLACE : null,
}

export const VIEW_CONTEXT: ViewContext = {
  ...FOLD_CONTEXT,
  nowMs: START + DAY,
  policyNow: DEFAULT_FILL_POLICY,
  retest: { soonDays: 120, notSeenDays: 30, missingDays: 90, intervalMonths: null, ownerChoices: [] },
  access: { personId: TECHNICIAN, roles: ['technician'], trainee: false },
  ...NOTHING_SAID,
  names: {
    place: id => ({ id, name: `place ${id.slice(-2)}` }),
    person: id => ({ id, name: `person ${id.slice(-2)}` }),
    firm: id => ({ id, name: `firm ${id.slice(-2)}` }),
  },
}

/** What the fold makes of a story. */
export function folded(...story: Told[]): FoldResult {
  return fold(recorded(...story), FOLD_CONTEXT)
}

/** The contents after a story. */
export function contentsAfter(...story: Told[]) {
  return folded(...story).state.contents
}

/** The view after a story, a day after its beginning unless another day is given. */
export function viewAfter(story: Told[], changes: Partial<ViewContext> = {}): CylinderView {
  return view(folded(...story).state, { ...VIEW_CONTEXT, ...changes })
}

/** Codes of the findings that the last event of a story was told. */
export function lastFindings(...story: Told[]): FindingCode[] {
  const { steps } = folded(...story)
  const last = steps.find(step => step.eventId === idOf(story.length - 1))
  return (last?.findings ?? []).map(({ code }) => code)
}

/** The movements of the last event of a story, as 'cause refrigerant grams', the owner's last two digits behind where one is named. */
export function lastMovements(...story: Told[]): string[] {
  const { movements } = folded(...story)
  return movements.filter(({ eventId }) => eventId === idOf(story.length - 1)).map(({ cause, refrigerant, grams, ownerId }) =>
    [cause, refrigerant ?? '?', grams, ...(ownerId === null ? [] : [ownerId.slice(-2)])].join(' '))
}

export function codes(shown: Pick<CylinderView, 'findings'>): FindingCode[] {
  return shown.findings.map(({ code }) => code)
}
