import type { FillPolicy } from '../capacity/types'
import type { Access } from '../access/roles'
import { readingGrams } from '../quantity/mass'
import type { Scale } from '../quantity/scale'
import type { Catalogue } from '../refrigerant/types'
import type { RetestRules } from '../requalification/ownerChoice'
import { capacityInWords, capacityOf } from './capacityOf'
import type { CylinderView, Named, RequalificationView } from './cylinderView'
import { dateFindings } from './dateFindings'
import { endOf } from './endOf'
import { urgencyOrder } from './findings/order'
import { retestUnknown } from './findings/retest'
import type { FoldContext } from './fold'
import { isGivenAway, lifecycleOf } from './lifecycle'
import { mayOf } from './mayOf'
import { retestOf } from './retestOf'
import type { SaidByOthers } from './saidByOthers'
import type { CylinderState } from './state'
import { stateFindings } from './stateFindings'

/** The names that people know places, persons and firms by. */
export interface Names {
  place: (id: string) => Named
  person: (id: string) => Named
  firm: (id: string) => Named
}

/** What a view takes from outside the log: today, the firm's rules, and who is asking. */
export interface ViewContext extends SaidByOthers {
  nowMs: number
  timeZone: string
  policyNow: FillPolicy
  policyAt: (ms: number) => FillPolicy
  catalogue: Catalogue
  scales: ReadonlyMap<string, Scale>
  retest: RetestRules & { soonDays: number, notSeenDays: number, missingDays: number }
  /** What the owner had settled about tests at an instant. */
  retestAt: (ms: number) => RetestRules
  placeOfFirm: FoldContext['placeOfFirm']
  askedRefrigerant?: string | null
  /** null shows the cylinder to nobody in particular: nothing may be done. */
  access: Access | null
  names: Names
}

/** Everything there is to say of one cylinder on a day, to one person. */
export function view(state: CylinderState, context: ViewContext): CylinderView {
  const retest = retestOf(state, {
    nowMs: context.nowMs, timeZone: context.timeZone, rules: context.retest, soonDays: context.retest.soonDays,
  })
  const capacity = capacityInWords(capacityOf(state, retest, context), state.stamp)
  const lifecycle = lifecycleOf(state)
  const { nothingInIt } = state.contents
  const findings = [
    ...stateFindings(state, capacity.fillLimitGrams, context),
    ...(retest.state === 'unknown' && endOf(state) === null && !isGivenAway(state) ? [retestUnknown()] : []),
    ...dateFindings({ lifecycle, nothingInIt, dueMonth: isGivenAway(state) ? null : retest.dueMonth, lastSeenAt: state.lastSeenAt }, context),
  ].sort(urgencyOrder)
  const shown = {
    id: state.id,
    version: state.version,
    labelCode: state.labelCode,
    labelledAt: instant(state.labels.find(({ code }) => code === state.labelCode)?.lastAt ?? null),
    oldLabelCodes: state.labels.map(({ code }) => code).filter(code => code !== state.labelCode),
    stamp: stampOf(state),
    marks: state.marks.map(({ enteredAt: _, ...mark }) => mark),
    lifecycle,
    holds: state.holds.map(({ hold }) => hold),
    place: state.placeId === null ? null : context.names.place(state.placeId),
    holder: state.holderId === null ? null : context.names.person(state.holderId),
    owner: state.ownerId === null ? null : context.names.firm(state.ownerId),
    ownership: state.ownership,
    contents: contentsOf(state),
    capacity,
    requalification: requalificationOf(retest),
    findings,
    waitsForSignatureOf: state.waitsForSignatureOf,
    lastEventAt: instant(state.lastEventAt),
  }
  return { ...shown, ...mayOf(shown, context.access) }
}

function stampOf({ stamp, tare, dedicatedTo }: CylinderState): CylinderView['stamp'] {
  if (stamp === null) return null
  return {
    ...stamp,
    tareWeightGrams: tare === null ? null : Math.round(tare.exactGrams),
    waterCapacityGrams: stamp.waterCapacity === null ? null : readingGrams(stamp.waterCapacity),
    dedicatedTo,
  }
}

function contentsOf({ contents }: CylinderState): CylinderView['contents'] {
  const isKnown = contents.netGrams !== null
  return {
    refrigerant: contents.refrigerant,
    condition: contents.condition,
    burnt: contents.burnt,
    inStock: contents.inStock,
    netGrams: contents.netGrams,
    uncertaintyGrams: contents.uncertaintyGrams,
    basis: contents.basis,
    evacuated: contents.evacuated,
    nothingInIt: contents.nothingInIt,
    owners: contents.nothingInIt ? [] : contents.shares.map(({ ownerId, grams }) => ({ ownerId, grams: isKnown ? grams : null })),
    asOf: instant(contents.asOf),
  }
}

function requalificationOf({ lastMonth, intervalMonths, dueMonth, state, basis, choice }: RequalificationView): RequalificationView {
  return { lastMonth, intervalMonths, dueMonth, state, basis, choice }
}

function instant(ms: number | null): string | null {
  return ms === null ? null : new Date(ms).toISOString()
}
