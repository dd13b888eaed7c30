import { NEARLY_FULL_RATIO } from '../capacity/nearlyFull'
import { excessGrams } from '../capacity/stopWeight'
import { exactGrams, floorToDivision, type MassReading } from '../quantity/mass'
import type { RecoveryPlan } from './plan'

/** How far a cylinder is filled: well below, nearly full, at the stop weight as its scale shows it, or past it. */
export type FillStage = 'below' | 'near' | 'stop' | 'past'

// What turning a reading into grams may lose.
const CONVERSION_NOISE_GRAMS = 0.5

/**
 * How far it is filled by what the scale shows.
 *
 * Rounding: the stop is reached at the stop weight rounded down to the division of that scale; past it is what would be
 * recorded as overfilled.
 */
export function fillStage({ stopGrams, tareGrams, limitGrams }: RecoveryPlan, gross: MassReading): FillStage {
  const grams = exactGrams(gross)
  if (excessGrams(stopGrams, grams) > 0) return 'past'
  if (grams + CONVERSION_NOISE_GRAMS >= exactGrams(floorToDivision(stopGrams, gross.unit))) return 'stop'
  return grams - tareGrams + CONVERSION_NOISE_GRAMS >= limitGrams * NEARLY_FULL_RATIO ? 'near' : 'below'
}

/** Whether a stage is to be acted upon at once. */
export function isStop(stage: FillStage): boolean {
  return stage === 'stop' || stage === 'past'
}
