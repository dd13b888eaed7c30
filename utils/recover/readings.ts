import { DENSEST_OVER_WATER } from '../capacity/densestOverWater'
import type { OnTheWay } from '../custody/draft/filled'
import { exactGrams, formatReading, type MassReading } from '../quantity/mass'
import { MOST_READINGS } from '../recovery/mostReadings'
import type { RecoveryPlan } from './plan'

/** A reading of the scale while the hoses are on. */
export type WayReading = NonNullable<OnTheWay['readings']>[number]

/** The readings with one more; of more than are kept the second goes first, so that the beginning and the end stay. */
export function withReading(readings: readonly WayReading[], reading: WayReading): WayReading[] {
  const all = [...readings, reading]
  return all.length > MOST_READINGS ? [all[0]!, ...all.slice(2)] : all
}

// What turning two readings into grams may lose.
const CONVERSION_NOISE_GRAMS = 0.5

/** Why a reading may be a slip of the finger, in a sentence that asks; null where it is as expected. */
export function readingDoubt({ tareGrams, waterFullGrams }: RecoveryPlan, gross: MassReading, last: MassReading | null): string | null {
  const grams = exactGrams(gross)
  const mostGrams = tareGrams + (waterFullGrams - tareGrams) * DENSEST_OVER_WATER
  if (grams + CONVERSION_NOISE_GRAMS < tareGrams) return `${formatReading(gross)} is less than the empty cylinder weighs. Is it what the scale shows?`
  if (grams > mostGrams) return `${formatReading(gross)} is more than any refrigerant in it could weigh. Is it what the scale shows?`
  if (last && grams + CONVERSION_NOISE_GRAMS < exactGrams(last)) return `${formatReading(gross)} is less than ${formatReading(last)} before. Is it what the scale shows?`
  return null
}
