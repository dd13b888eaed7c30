import type { MassReading } from '../quantity/mass'
import type { Rate } from '../reclaim/price'

/** Finer than any scale or statement gives a mass. */
const PER_UNIT = 1_000_000
const OUNCES_PER_POUND = 16
// Exact by definition of the international pound (1959): 1 lb = 0.45359237 kg.
const POUND = { kilograms: 45_359_237n, of: 100_000_000n }
const MILLS_PER_CENT = 10n

/**
 * What a mass, as it was read, is worth at a rate, in cents; negative where it is charged.
 *
 * It is reckoned from the reading itself and not from whole grams: those lose up to half a gram, which at a high price is
 * a cent that the statement would seem to be wrong by.
 *
 * Rounding: to the nearest cent, halves away from zero; reckoned exactly before that.
 *
 * @example creditOfReading({ mills: 8_000, per: 'lb' }, { unit: 'lb', value: 33.3 }) // 26_640
 */
export function creditOfReading({ mills, per }: Rate, reading: MassReading): number {
  const unit = reading.unit === 'kg' ? 'kg' : 'lb'
  const mass = BigInt(Math.round(inUnits(reading) * PER_UNIT))
  let above = BigInt(mills) * mass
  let below = MILLS_PER_CENT * BigInt(PER_UNIT)
  if (unit === 'lb' && per === 'kg') [above, below] = [above * POUND.kilograms, below * POUND.of]
  if (unit === 'kg' && per === 'lb') [above, below] = [above * POUND.of, below * POUND.kilograms]
  return nearest(above, below)
}

function inUnits(reading: MassReading): number {
  return reading.unit === 'lb-oz' ? reading.lb + reading.oz / OUNCES_PER_POUND : reading.value
}

function nearest(above: bigint, below: bigint): number {
  const size = above < 0n ? -above : above
  const whole = Number((2n * size + below) / (2n * below))
  return above < 0n && whole !== 0 ? -whole : whole
}
