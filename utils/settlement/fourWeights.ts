import { readingGrams } from '../quantity/mass'
import { scaleAccuracyGrams, type Scale } from '../quantity/scale'
import type { LineFigures, SentFigures } from './figures'

/** How far one of their weights lies from ours. */
export interface WeightDifference {
  /** Theirs less ours. */
  grams: number
  /** What both scales together may be off. */
  accuracyGrams: number
  isBeyond: boolean
}

/** Our gross and net and theirs, side by side; null for what nobody knows. */
export interface FourWeights {
  ourGrossGrams: number | null
  ourNetGrams: number | null
  theirGrossGrams: number | null
  acceptedNetGrams: number | null
  /** null where one of the two is not known. */
  gross: WeightDifference | null
  net: WeightDifference | null
}

/**
 * The four weights of a line and how far theirs lie from ours.
 *
 * A net comes from one gross weighing less the stamped tare, so it is as accurate as the gross under it. The accuracy of
 * their scale is not known to us: it counts as that of a scale that nobody named.
 *
 * Units: grams. Rounding: their readings to the nearest gram, each accuracy up to the whole gram.
 */
export function fourWeights(sent: SentFigures | null, theirs: Pick<LineFigures, 'theirGross' | 'acceptedNet'>, ourScale?: Scale): FourWeights {
  const weights = {
    ourGrossGrams: sent?.grossGrams ?? null,
    ourNetGrams: sent?.netGrams ?? null,
    theirGrossGrams: theirs.theirGross && readingGrams(theirs.theirGross),
    acceptedNetGrams: theirs.acceptedNet && readingGrams(theirs.acceptedNet),
  }
  const accuracyGrams = bothScales(weights.ourGrossGrams, weights.theirGrossGrams, ourScale)
  return {
    ...weights,
    gross: difference(weights.ourGrossGrams, weights.theirGrossGrams, accuracyGrams),
    net: difference(weights.ourNetGrams, weights.acceptedNetGrams, accuracyGrams),
  }
}

function bothScales(ourGross: number | null, theirGross: number | null, ourScale: Scale | undefined): number | null {
  if (ourGross === null) return null
  return scaleAccuracyGrams(ourGross, ourScale) + scaleAccuracyGrams(theirGross ?? ourGross)
}

function difference(ours: number | null, theirs: number | null, accuracyGrams: number | null): WeightDifference | null {
  if (ours === null || theirs === null || accuracyGrams === null) return null
  const grams = theirs - ours
  return { grams, accuracyGrams, isBeyond: Math.abs(grams) > accuracyGrams }
}
