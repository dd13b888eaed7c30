import { formatThermometer } from '../quantity/gauge'
import { celsiusFromKelvin } from '../quantity/temperature'
import { absolutePressureKPa, type PressureReading } from './pressureReading'
import { hasLiquidAt, saturationAt } from './saturation'
import type { Refrigerant } from './types'

/** What a reading says beside the saturation pressure. */
export type PressureVerdict = 'agrees' | 'excess' | 'below'

/** A pressure beside what a refrigerant can have at that temperature while liquid is left. Units: kPa, C. */
export interface PressureCheck {
  /** The lowest pressure with liquid left: the last drop of a blend. Absolute. */
  dewKPa: number
  /** The highest: hardly any vapour. Absolute. The same as the dew pressure for a single fluid. */
  bubbleKPa: number
  /** What stood in the cylinder, by the barometer. */
  absoluteKPa: number
  /** Above the bubble pressure; negative within the band and below it. */
  excessKPa: number
  /** How fast the nearer edge of the band rises with temperature. */
  slopeKPaPerC: number
  /** What the gauge and the thermometer together may be off, at the nearer edge. */
  toleranceKPa: number
  /** What the refrigerant's own figures may be off, at the nearer edge. */
  dataErrorKPa: number
  /** From where to where a reading agrees: each edge of the band, widened by what it may be off. Absolute. */
  agreesFromKPa: number
  agreesToKPa: number
  verdict: PressureVerdict
  relativeErrorPressure: number
  accuracyGroup: Refrigerant['accuracyGroup']
  doubt: string | null
  source: string
}

// Far below the step of the tables, and far above what is lost in a difference of two pressures.
const SLOPE_STEP_C = 0.05

/**
 * Judges the pressure of a cylinder at rest against the band between a refrigerant's dew and bubble pressure.
 *
 * A pressure above the band says that more than this refrigerant is in it, or another; it never says what. The band is
 * widened by what the instruments may be off, a thermometer's error by the slope of the edge, and apart from that by
 * what the refrigerant's figures may be off.
 *
 * Errors: RangeError where the table has no liquid at the temperature ({@link whyNoCheck} says why), for an absolute
 * pressure below zero, and for an error below zero.
 */
export function pressureCheck(input: PressureReading & { refrigerant: Refrigerant }): PressureCheck {
  const { refrigerant, temperatureC, gaugeErrorKPa, thermometerErrorC } = input
  const absoluteKPa = absolutePressureKPa(input)
  if (!(absoluteKPa >= 0)) throw new RangeError(`No absolute pressure: ${absoluteKPa}`)
  if (!(gaugeErrorKPa >= 0) || !(thermometerErrorC >= 0)) throw new RangeError('An instrument cannot be off by less than nothing')
  const { dewPressureKPa: dewKPa, bubblePressureKPa: bubbleKPa, relativeErrorPressure, accuracyGroup, doubt, source } = saturationAt(refrigerant, temperatureC)
  const dew = edgeOf(input, 'dewPressureKPa', dewKPa)
  const bubble = edgeOf(input, 'bubblePressureKPa', bubbleKPa)
  const nearer = absoluteKPa >= (bubbleKPa + dewKPa) / 2 ? bubble : dew
  const agreesFromKPa = Math.max(0, dewKPa - dew.toleranceKPa - dew.dataErrorKPa)
  const agreesToKPa = bubbleKPa + bubble.toleranceKPa + bubble.dataErrorKPa
  return {
    dewKPa,
    bubbleKPa,
    absoluteKPa,
    excessKPa: absoluteKPa - bubbleKPa,
    ...nearer,
    agreesFromKPa,
    agreesToKPa,
    verdict: absoluteKPa > agreesToKPa ? 'excess' : absoluteKPa < agreesFromKPa ? 'below' : 'agrees',
    relativeErrorPressure,
    accuracyGroup,
    doubt,
    source,
  }
}

/** Why a pressure says nothing of a refrigerant at a temperature; null where a check is possible. */
export function whyNoCheck(refrigerant: Refrigerant, temperatureC: number): string | null {
  if (hasLiquidAt(refrigerant, temperatureC)) return null
  const { designation, table, tableMaxC, tcK } = refrigerant
  const coldestC = table[0]?.tC ?? tableMaxC
  const at = bothScales(temperatureC)
  if (temperatureC < coldestC) return `The figures of ${designation} begin at ${bothScales(coldestC)}. None is known at ${at}.`
  const criticalC = celsiusFromKelvin(tcK)
  return temperatureC >= criticalC
    ? `At ${at} ${designation} has no liquid: from ${bothScales(criticalC)} up it is a gas, and its pressure depends on how much is in the cylinder.`
    : `The figures of ${designation} end at ${bothScales(tableMaxC)}. None is known at ${at}.`
}

function bothScales(tC: number): string {
  return `${formatThermometer(tC, 'psi')} (${formatThermometer(tC, 'bar')})`
}

type Edge = 'dewPressureKPa' | 'bubblePressureKPa'

/** What a reading at an edge of the band may be off. */
function edgeOf(
  { refrigerant, temperatureC, gaugeErrorKPa, thermometerErrorC }: PressureReading & { refrigerant: Refrigerant }, edge: Edge, edgeKPa: number,
): Pick<PressureCheck, 'slopeKPaPerC' | 'toleranceKPa' | 'dataErrorKPa'> {
  const slopeKPaPerC = slopeAt(refrigerant, temperatureC, edge)
  return {
    slopeKPaPerC,
    toleranceKPa: gaugeErrorKPa + Math.abs(slopeKPaPerC) * thermometerErrorC,
    dataErrorKPa: refrigerant.relativeErrorPressure * edgeKPa,
  }
}

// By a difference, one-sided at an end of the table.
function slopeAt(refrigerant: Refrigerant, tC: number, edge: Edge): number {
  const low = hasLiquidAt(refrigerant, tC - SLOPE_STEP_C) ? tC - SLOPE_STEP_C : tC
  const high = hasLiquidAt(refrigerant, tC + SLOPE_STEP_C) ? tC + SLOPE_STEP_C : tC
  return (saturationAt(refrigerant, high)[edge] - saturationAt(refrigerant, low)[edge]) / (high - low)
}
