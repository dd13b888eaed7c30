import { exactGrams } from '../quantity/mass'
import type { Stamp } from './types'

/**
 * The tare weight that counts for a cylinder: the one a retest set, else the stamped one, else null.
 *
 * Units: grams, unrounded. A stamped tare without the valve is not the weight of the empty cylinder and counts as not known.
 */
export function tareInForceGrams(stamp: Stamp, tareGrams?: number | null): number | null {
  if (tareGrams !== null && tareGrams !== undefined) return tareGrams
  if (stamp.tareWeight === null || stamp.tareIncludesValve === false) return null
  return exactGrams(stamp.tareWeight)
}

/**
 * The gross weight at which filling stops: tare and fill limit together, both unrounded.
 *
 * Rounding: `stopWeightGrams` down; the unrounded sum is for the division of a scale.
 */
export function stopWeight(exactLimitGrams: number, exactTareGrams: number): { stopWeightGrams: number, exactStopWeightGrams: number } {
  const exactStopWeightGrams = exactTareGrams + exactLimitGrams
  return { stopWeightGrams: Math.floor(exactStopWeightGrams), exactStopWeightGrams }
}

// What a scale's division is rounded by before it is shown as a stop weight: filled to that, a cylinder is at its limit.
const CONVERSION_NOISE_GRAMS = 0.5

/** By how much a net lies above a limit, both unrounded; 0 where it does not by more than the noise of conversion. Units: grams. */
export function excessGrams(exactLimitGrams: number, exactNetGrams: number): number {
  const excess = exactNetGrams - exactLimitGrams
  return excess > CONVERSION_NOISE_GRAMS ? excess : 0
}

/** What may still go in: fill limit less net, negative when overfilled. Units: grams. */
export function roomGrams(limitGrams: number, netGrams: number): number {
  return limitGrams - netGrams
}
