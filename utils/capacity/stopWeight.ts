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

/** What may still go in: fill limit less net, negative when overfilled. Units: grams. */
export function roomGrams(limitGrams: number, netGrams: number): number {
  return limitGrams - netGrams
}
