import { scaleAccuracyGrams } from '../quantity/scale'

/**
 * How far a reclaimer's weight lies from ours, where that is beyond what both scales may be off; null within it or
 * where one weight is not known.
 *
 * Units: grams; negative where theirs is the lower. The accuracy is that of the gross weights the figures came from.
 */
export function settlementDifferenceGrams(oursGrams: number | null, theirsGrams: number | null, grossGrams: number): number | null {
  if (oursGrams === null || theirsGrams === null) return null
  const difference = theirsGrams - oursGrams
  return Math.abs(difference) > 2 * scaleAccuracyGrams(grossGrams) ? difference : null
}
