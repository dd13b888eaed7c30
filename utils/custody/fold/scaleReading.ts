import { DENSEST_OVER_WATER } from '../../capacity/densestOverWater'
import { volumeLitres } from '../../capacity/rules/ruleInput'
import { exactGrams, readingGrams, type MassReading } from '../../quantity/mass'
import { scaleAccuracyGrams } from '../../quantity/scale'
import { hasLiquidAt, saturationAt } from '../../refrigerant/saturation'
import { aboveVolume, belowTare } from '../findings/weight'
import { isConfirmed, type Turn } from './turn'

/** A gross weight against the tare in force. */
export interface ScaleReading {
  grossGrams: number
  accuracyGrams: number
  /** Gross less tare, signed; null without a tare. */
  aboveTareGrams: number | null
  /** The same of the reading and the tare as they were entered. */
  exactAboveTareGrams: number | null
  /** Never negative: null without a tare, and where the scale shows less than the tare allows for. */
  netGrams: number | null
  isBelowTare: boolean
  /** As light as the empty cylinder, within the accuracy of the scale. */
  isAtTare: boolean
  isAboveTare: boolean
}

/** What a gross weight says of the contents. */
export function readScale(turn: Turn, gross: MassReading, scaleId?: string): ScaleReading {
  const grossGrams = readingGrams(gross)
  const accuracyGrams = scaleAccuracyGrams(grossGrams, scaleId === undefined ? undefined : turn.context.scales.get(scaleId))
  const { tare } = turn.state
  if (tare === null) {
    return {
      grossGrams, accuracyGrams, aboveTareGrams: null, exactAboveTareGrams: null, netGrams: null,
      isBelowTare: false, isAtTare: false, isAboveTare: false,
    }
  }
  const aboveTareGrams = grossGrams - Math.round(tare.exactGrams)
  const isBelowTare = aboveTareGrams < -accuracyGrams
  return {
    grossGrams,
    accuracyGrams,
    aboveTareGrams,
    exactAboveTareGrams: exactGrams(gross) - tare.exactGrams,
    netGrams: isBelowTare ? null : Math.max(0, aboveTareGrams),
    isBelowTare,
    isAtTare: Math.abs(aboveTareGrams) <= accuracyGrams,
    isAboveTare: aboveTareGrams > accuracyGrams,
  }
}

/** Keeps the reading that the net now rests on. */
export function restOn(turn: Turn, reading: ScaleReading): void {
  const { contents } = turn.state
  const isKnown = contents.netGrams !== null
  contents.basis = isKnown ? 'weighed' : 'unknown'
  contents.grossGrams = reading.grossGrams
  contents.uncertaintyGrams = isKnown ? reading.accuracyGrams : null
  if (isKnown && !contents.nothingInIt) contents.lastKnownNetGrams = Math.max(0, reading.exactAboveTareGrams ?? 0)
  contents.asOf = turn.event.effectiveAt
}

/** The net now rests on no reading: it follows from what happened, or is unknown. */
export function restOnNothing(turn: Turn): void {
  const { contents } = turn.state
  contents.basis = contents.netGrams === null ? 'unknown' : 'reckoned'
  contents.grossGrams = null
  contents.uncertaintyGrams = null
  contents.asOf = turn.event.effectiveAt
}

/** Raises what is odd about a reading by itself: below the tare, or more than the cylinder could hold. */
export function doubtReading(turn: Turn, reading: ScaleReading): void {
  const confirmed = isConfirmed(turn, 'weigh-again')
  if (reading.isBelowTare && reading.aboveTareGrams !== null) turn.findings.push(belowTare(-reading.aboveTareGrams, confirmed))
  const most = mostItCouldHold(turn)
  if (most !== null && reading.netGrams !== null && reading.netGrams > most) {
    turn.findings.push(aboveVolume(reading.netGrams - most, confirmed))
  }
}

// Common practice, from memory: hardly any liquid is loaded colder.
const COLDEST_LOADED_C = -40

function mostItCouldHold({ state, context }: Turn): number | null {
  const waterCapacity = state.stamp?.waterCapacity
  if (!waterCapacity) return null
  const name = state.contents.refrigerant
  const refrigerant = name === null ? undefined : context.catalogue.refrigerants.get(name)
  if (refrigerant && hasLiquidAt(refrigerant, COLDEST_LOADED_C)) {
    return volumeLitres(waterCapacity) * saturationAt(refrigerant, COLDEST_LOADED_C).liquidDensity
  }
  return readingGrams(waterCapacity) * DENSEST_OVER_WATER
}
