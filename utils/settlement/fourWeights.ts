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
 * Units: grams. Rounding: their readings to the nearest gram, each accuracy up to the whole gram.
 */
export function fourWeights(sent: SentFigures | null, { theirGross, acceptedNet }: Pick<LineFigures, 'theirGross' | 'acceptedNet'>, ourScale?: Scale): FourWeights {
  return weightsInGrams(sent, { theirGrossGrams: theirGross && readingGrams(theirGross), acceptedNetGrams: acceptedNet && readingGrams(acceptedNet) }, ourScale)
}

/**
 * The same of their weights in whole grams.
 *
 * A net comes from one gross weighing less the stamped tare, so it is as accurate as the gross under it. The accuracy of
 * their scale is not known to us: it counts as that of a scale that nobody named.
 */
export function weightsInGrams(
  sent: Pick<SentFigures, 'grossGrams' | 'netGrams'> | null, theirs: { theirGrossGrams: number | null, acceptedNetGrams: number | null }, ourScale?: Scale,
): FourWeights {
  const { theirGrossGrams, acceptedNetGrams } = theirs
  const [ourGrossGrams, ourNetGrams] = [sent?.grossGrams ?? null, sent?.netGrams ?? null]
  const accuracyGrams = bothScales(ourGrossGrams, theirGrossGrams, ourScale)
  return {
    ourGrossGrams, ourNetGrams, theirGrossGrams, acceptedNetGrams,
    gross: difference(ourGrossGrams, theirGrossGrams, accuracyGrams),
    net: difference(ourNetGrams, acceptedNetGrams, accuracyGrams),
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
