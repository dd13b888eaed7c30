import type { FillPolicy } from '../capacity/types'
import { readingGrams } from '../quantity/mass'
import type { Month } from '../quantity/month'
import type { Catalogue } from '../refrigerant/types'
import type { RetestRules } from '../requalification/ownerChoice'
import { capacityOf } from './capacityOf'
import type { CylinderRow, Lifecycle } from './cylinderView'
import { dateFindings, isOverdue, unseenDays, type Day } from './dateFindings'
import { endOf } from './endOf'
import type { FindingCode, Severity } from './finding'
import { urgencyOrder } from './findings/order'
import { retestUnknown } from './findings/retest'
import type { EventKind } from './kinds'
import { isGivenAway, lifecycleOf } from './lifecycle'
import { retestOf } from './retestOf'
import type { SaidByOthers } from './saidByOthers'
import type { CylinderState } from './state'
import { stateFindings } from './stateFindings'
import type { Names } from './view'

/** What the columns of a cylinder depend on beside its events; the date is not among it, only the rule in force. */
export interface RowContext extends SaidByOthers {
  policyNow: FillPolicy
  policyAt: (ms: number) => FillPolicy
  catalogue: Catalogue
  timeZone: string
  retest: RetestRules
}

/** The columns that lists filter and sort by. */
export interface RowColumns {
  version: number
  labelCode: string | null
  serial: string | null
  spec: string | null
  placeId: string | null
  holderId: string | null
  ownerId: string | null
  refrigerant: string | null
  condition: CylinderRow['condition']
  lifecycle: Lifecycle
  /** A firm has it in exchange for another: lists leave it out unless they are asked for it. */
  givenAway: boolean
  nothingInIt: boolean
  netGrams: number | null
  fillLimitGrams: number | null
  governingRule: CylinderRow['governingRule']
  /** Room and stop weight as they are until the retest is overdue. */
  roomGrams: number | null
  stopWeightGrams: number | null
  exactStopWeight: string | null
  tareWeightGrams: number | null
  waterCapacityGrams: number | null
  dueMonth: Month | null
  retestState: 'dated' | 'unknown' | 'not-required'
  lastEventAt: number | null
  lastEventKind: EventKind | null
  lastSeenAt: number | null
  /** Codes of the findings that no date changes, the most urgent first, each between spaces. */
  findingCodes: string
  /** 2 = a stop stands whatever the date, 1 = a caution, 0 = none. */
  severity: number
}

/** A row as it comes from the cache. */
export interface CachedRow extends RowColumns { id: string }

/** A day, the firm's reminders, and the names for a row. */
export interface RowDay extends Day { names: Names }

/** The cached columns of a cylinder. They hold until its next event or the next change of the firm's rules. */
export function cacheRow(state: CylinderState, context: RowContext): RowColumns {
  const { stamp, tare, contents } = state
  const retest = retestOnNoDay(state, context)
  // A date that has passed is the reader's to see; whether one is known at all is not a matter of the day.
  const undated = retest.state === 'unknown' || retest.state === 'not-required' ? retest : { ...retest, state: 'in-date' as const }
  const capacity = capacityOf(state, undated, context)
  const findings = [
    ...stateFindings(state, capacity.fillLimitGrams, context),
    ...(retest.state === 'unknown' && endOf(state) === null && !isGivenAway(state) ? [retestUnknown()] : []),
  ].sort(urgencyOrder)
  const codes = [...new Set(findings.map(({ code }) => code))]
  return {
    version: state.version,
    labelCode: state.labelCode,
    serial: stamp?.serial ?? null,
    spec: stamp?.spec ?? null,
    placeId: state.placeId,
    holderId: state.holderId,
    ownerId: state.ownerId,
    refrigerant: contents.refrigerant,
    condition: contents.condition,
    lifecycle: lifecycleOf(state),
    givenAway: isGivenAway(state),
    nothingInIt: contents.nothingInIt,
    netGrams: contents.netGrams,
    fillLimitGrams: capacity.fillLimitGrams,
    governingRule: capacity.governingRule,
    roomGrams: capacity.roomGrams,
    stopWeightGrams: capacity.stopWeightGrams,
    exactStopWeight: capacity.exactStopWeightGrams === null ? null : String(capacity.exactStopWeightGrams),
    tareWeightGrams: stamp === null || tare === null ? null : Math.round(tare.exactGrams),
    waterCapacityGrams: stamp?.waterCapacity ? readingGrams(stamp.waterCapacity) : null,
    dueMonth: isGivenAway(state) ? null : retest.dueMonth,
    retestState: undated.state === 'in-date' ? 'dated' : undated.state === 'unknown' ? 'unknown' : 'not-required',
    lastEventAt: state.lastEventAt,
    lastEventKind: state.lastEventKind,
    lastSeenAt: state.lastSeenAt,
    findingCodes: codes.length === 0 ? '' : ` ${codes.join(' ')} `,
    severity: findings.some(({ severity }) => severity === 'stop') ? 2 : Math.min(1, findings.length),
  }
}

/** A cached row as it reads on a day: an overdue cylinder has no stop weight and no room. */
export function rowToday(cached: CachedRow, day: RowDay): CylinderRow {
  const overdue = isOverdue(cached.dueMonth, day)
  const findings = [...cachedFindings(cached), ...dateFindings(cached, day)].sort(urgencyOrder)
  const worst = findings[0]
  const days = unseenDays(cached, day)
  return {
    id: cached.id,
    labelCode: cached.labelCode,
    serial: cached.serial,
    spec: cached.spec,
    place: cached.placeId === null ? null : day.names.place(cached.placeId),
    holder: cached.holderId === null ? null : day.names.person(cached.holderId),
    owner: cached.ownerId === null ? null : day.names.firm(cached.ownerId),
    refrigerant: cached.refrigerant,
    condition: cached.condition,
    lifecycle: cached.lifecycle,
    nothingInIt: cached.nothingInIt,
    netGrams: cached.netGrams,
    fillLimitGrams: cached.fillLimitGrams,
    governingRule: cached.governingRule,
    roomGrams: overdue ? null : cached.roomGrams,
    stopWeightGrams: overdue ? null : cached.stopWeightGrams,
    exactStopWeightGrams: overdue || cached.exactStopWeight === null ? null : Number(cached.exactStopWeight),
    tareWeightGrams: cached.tareWeightGrams,
    waterCapacityGrams: cached.waterCapacityGrams,
    dueMonth: cached.dueMonth,
    lastEventAt: cached.lastEventAt === null ? null : new Date(cached.lastEventAt).toISOString(),
    lastEventKind: cached.lastEventKind,
    unseen: days === null ? null : { days, isLong: days >= day.retest.missingDays },
    worstFinding: worst ? { code: worst.code, severity: worst.severity } : null,
    findingCodes: [...new Set(findings.map(({ code }) => code))],
  }
}

// The due month does not change with the day, so any instant will do that is not before the last mark was entered.
function retestOnNoDay(state: CylinderState, context: RowContext) {
  const nowMs = Math.max(0, state.lastEventAt ?? 0, state.registeredAt ?? 0, ...state.marks.map(({ enteredAt }) => enteredAt))
  return retestOf(state, { nowMs, timeZone: context.timeZone, rules: context.retest })
}

const STOPS: ReadonlySet<FindingCode> = new Set<FindingCode>([
  'overfill', 'pressure-class', 'spec-not-for-gas', 'not-refillable', 'not-marked-flammable', 'second-refrigerant',
  'unknown-onto-known', 'retest-unknown', 'early-test', 'wet', 'rejected', 'condemned', 'quarantined', 'code-on-two', 'unsupervised', 'after-end',
])

function cachedFindings({ findingCodes }: CachedRow): { code: FindingCode, severity: Severity }[] {
  const codes = findingCodes.split(' ').filter(code => code !== '') as FindingCode[]
  return codes.map(code => ({ code, severity: STOPS.has(code) ? 'stop' : 'caution' }))
}
