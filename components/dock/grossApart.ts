import { readingGrams, type MassReading } from '~~/utils/quantity/mass'
import { weightsInGrams } from '~~/utils/settlement/fourWeights'

/** How far a weight read at the dock lies from the one it left with, beyond both scales' accuracy; null within it. Units: grams, negative where theirs is the lower. */
export function grossApartGrams(theirs: MassReading, ours: MassReading): number | null {
  const { gross } = weightsInGrams({ grossGrams: readingGrams(ours), netGrams: null }, { theirGrossGrams: readingGrams(theirs), acceptedNetGrams: null })
  return gross?.isBeyond ? gross.grams : null
}
