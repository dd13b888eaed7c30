import { fillLimit } from '../capacity/fillLimit'
import { termsWithoutFigure } from '../capacity/fillTerm'
import { fitFindings } from '../capacity/fit'
import { liquidFullTemperature } from '../capacity/liquidFull'
import { HOT_REFERENCE_C, isLiquidWhenHot, volumeLitres } from '../capacity/rules/ruleInput'
import { workingText } from '../capacity/rules/sumText'
import { excessGrams, roomGrams, stopWeight } from '../capacity/stopWeight'
import { twoPhase } from '../capacity/twoPhase'
import { DEFAULT_FILL_POLICY, type FillLimit, type FillPolicy, type FillTerm, type Stamp } from '../capacity/types'
import { exactGrams } from '../quantity/mass'
import type { Catalogue } from '../refrigerant/types'
import type { Requalification } from '../requalification/requalification'
import type { CapacityView, Missing } from './cylinderView'
import { endOf } from './endOf'
import type { Finding } from './finding'
import { holdFinding } from './findings/holds'
import { notEvacuatedFor } from './findings/mixing'
import { urgencyOrder } from './findings/order'
import { away, ended, nowhere } from './findings/record'
import { retestOverdue, retestUnknown } from './findings/retest'
import { standingFinding } from './findings/standing'
import type { CylinderState } from './state'

/** What a capacity rests on beside the cylinder. */
export interface CapacityContext {
  policyNow: FillPolicy
  catalogue: Catalogue
  /** The refrigerant somebody asks about, for a cylinder with nothing in it. */
  askedRefrigerant?: string | null
}

/** A cylinder's capacity in figures; {@link capacityInWords} writes its sums out. */
export type Capacity = Omit<CapacityView, 'terms'> & { terms: FillTerm[] }

/**
 * How much a cylinder may hold and at which weight to stop, or why there is no such number.
 *
 * The limit is of what is in it; where nothing is, of the refrigerant it is kept for, else of the one asked about.
 * While anything speaks against a fill there is no stop weight and no room; a weight that is not known leaves the stop
 * weight but no room.
 */
export function capacityOf(state: CylinderState, retest: Requalification, context: CapacityContext): Capacity {
  const { stamp, tare, contents } = state
  const { policyNow: policy, catalogue } = context
  const forRefrigerant = contents.nothingInIt ? state.dedicatedTo ?? context.askedRefrigerant ?? null : contents.refrigerant
  const limit = stamp === null
    ? NO_STAMP
    : fillLimit({
        stamp, refrigerant: forRefrigerant, condition: contents.condition, burnt: contents.burnt, policy, catalogue,
        tareGrams: tare?.exactGrams ?? null,
      })
  const refusals = refusalsOfFill(state, retest, forRefrigerant, catalogue)
  const missing: Missing[] = [
    ...limit.missing,
    ...(contents.netGrams === null ? ['weight' as const] : []),
    ...(retest.state === 'unknown' ? ['testDate' as const] : []),
  ]
  const mayHaveStop = refusals.length === 0 && missing.every(input => input === 'weight')
  const exact = mayHaveStop && limit.exactLimitGrams !== null && tare !== null ? limit.exactLimitGrams : null
  const heat = withHeat(state, forRefrigerant, limit.exactLimitGrams, catalogue)
  const stop = exact === null || tare === null ? null : stopWeight(exact, tare.exactGrams)
  return {
    forRefrigerant,
    governingRule: limit.governingRule,
    fillLimitGrams: limit.fillLimitGrams,
    stopWeightGrams: stop?.stopWeightGrams ?? null,
    exactStopWeightGrams: stop?.exactStopWeightGrams ?? null,
    roomGrams: exact === null ? null : roomOf(state, exact),
    liquidFull: heat.liquidFull,
    hotLiquidShare: heat.hotLiquidShare,
    share: Math.min(policy.shareThousandths, DEFAULT_FILL_POLICY.shareThousandths) / 1000,
    terms: limit.terms,
    missing,
    refusals,
  }
}

/** A capacity with the sum of each rule as the trade writes it. */
export function capacityInWords(capacity: Capacity, stamp: Stamp | null): CapacityView {
  const waterCapacity = stamp?.waterCapacity ?? null
  const inWords = (term: FillTerm) => ({ working: waterCapacity === null ? '' : workingText(term, waterCapacity), ...term })
  return { ...capacity, terms: capacity.terms.map(inWords) }
}

// Whole grams of tare and reading may add up to one above the limit: at its stop weight a cylinder is full, not overfilled.
function roomOf({ contents }: CylinderState, exactLimitGrams: number): number | null {
  const { netGrams, nothingInIt, lastKnownNetGrams } = contents
  if (netGrams === null) return null
  const room = roomGrams(Math.floor(exactLimitGrams), netGrams)
  const exactNetGrams = nothingInIt ? netGrams : lastKnownNetGrams ?? netGrams
  return room < 0 && excessGrams(exactLimitGrams, exactNetGrams) === 0 ? 0 : room
}

const NO_STAMP: FillLimit = {
  governingRule: null, exactLimitGrams: null, fillLimitGrams: null, terms: termsWithoutFigure('the stamp is not known'),
  missing: ['tareWeight', 'waterCapacity', 'servicePressure', 'refrigerant'],
}

/** Everything that keeps a cylinder from being filled now; an overfill is not among it, for that shows as room. */
function refusalsOfFill(state: CylinderState, retest: Requalification, refrigerant: string | null, catalogue: Catalogue): Finding[] {
  const { stamp, away: where, missing } = state
  const end = endOf(state)
  const fit = stamp === null ? [] : fitFindings({ stamp, refrigerant, catalogue })
  return [
    ...fit.filter(({ severity }) => severity === 'stop').map(finding => ({ ...finding, since: null })),
    ...state.standing.filter(({ code }) => code === 'second-refrigerant' || code === 'unknown-onto-known').map(standingFinding),
    ...againstTraces(state, refrigerant),
    ...state.holds.map(holdFinding),
    ...(retest.state === 'overdue' && retest.dueMonth !== null ? [retestOverdue(retest.dueMonth, { severity: 'stop', nothingInIt: state.contents.nothingInIt })] : []),
    ...(retest.state === 'unknown' ? [retestUnknown()] : []),
    ...(missing ? [nowhere(missing)] : []),
    ...(where ? [away(where.at, where.since)] : []),
    ...(end === null ? [] : [ended(end)]),
  ].sort(urgencyOrder)
}

// An empty cylinder keeps the traces of what was in it until a deep vacuum.
function againstTraces({ contents, standing }: CylinderState, refrigerant: string | null): Finding[] {
  if (!contents.nothingInIt || refrigerant === null || standing.some(({ code }) => code === 'second-refrigerant')) return []
  const others = contents.knownSinceVacuum.filter(name => name !== refrigerant)
  return others.length === 0 ? [] : [notEvacuatedFor(refrigerant, others)]
}

// Of the present net; where nothing is in it, of the limit it would be filled to.
function withHeat(
  state: CylinderState, name: string | null, exactLimitGrams: number | null, catalogue: Catalogue,
): Pick<CapacityView, 'liquidFull' | 'hotLiquidShare'> {
  const { stamp, contents } = state
  const netGrams = contents.nothingInIt ? exactLimitGrams : contents.netGrams
  const isNameless = name === null || (!contents.nothingInIt && (contents.condition === 'mixed' || contents.condition === 'unknown'))
  const refrigerant = isNameless ? null : catalogue.refrigerants.get(name) ?? null
  if (netGrams === null || refrigerant === null || !stamp?.waterCapacity) return { liquidFull: null, hotLiquidShare: null }
  const litres = volumeLitres(stamp.waterCapacity)
  return {
    liquidFull: liquidFullTemperature({ netGrams, waterCapacityGrams: exactGrams(stamp.waterCapacity), refrigerant }),
    hotLiquidShare: isLiquidWhenHot(refrigerant)
      ? twoPhase({ netGrams, volumeLitres: litres, refrigerant, tC: HOT_REFERENCE_C }).liquidShare
      : null,
  }
}
