import { exactGrams } from '../quantity/mass'

/** What may go on a vehicle as materials of trade: one cylinder, and all together. Units: gross grams. Source: 49 CFR 173.6(a)(2), (d). */
export const MATERIALS_OF_TRADE = {
  eachGrams: exactGrams({ unit: 'lb', value: 220 }),
  togetherGrams: exactGrams({ unit: 'lb', value: 440 }),
  source: '49 CFR 173.6',
} as const

/** From this gross on a vehicle with gases of divisions 2.1 and 2.2 is placarded. Units: grams. Source: 49 CFR 172.504(c). */
export const PLACARD_FROM_GRAMS = exactGrams({ unit: 'lb', value: 1001 })

/** A cylinder aboard, as far as it is known. */
export interface Aboard { tareWeightGrams: number | null, netGrams: number | null }

/** What is aboard against what may be there without a shipping paper. */
export interface VanLoad {
  /** Of the cylinders whose gross is known. */
  knownGrossGrams: number
  withoutWeight: number
  /** Cylinders that are above the limit of one. */
  tooHeavy: number
  /** What else is carried; null where nobody has said. */
  otherGrams: number | null
  /** All that is known: cylinders and what else is carried. */
  allGrams: number
  /** What may still come aboard; negative when it is too much. */
  leftGrams: number
  isOver: boolean
}

/**
 * Adds up the gross weight aboard; the limit is over all materials of trade together, cylinders or not.
 *
 * Cylinders without a known gross are counted, never taken as nothing; so is what nobody has said of the rest.
 */
export function vanLoad(cylinders: readonly Aboard[], otherGrams: number | null = null): VanLoad {
  const known = cylinders.map(grossGrams).filter(gross => gross !== null)
  const knownGrossGrams = known.reduce((sum, gross) => sum + gross, 0)
  const tooHeavy = known.filter(gross => gross > MATERIALS_OF_TRADE.eachGrams).length
  const allGrams = knownGrossGrams + (otherGrams ?? 0)
  const leftGrams = MATERIALS_OF_TRADE.togetherGrams - allGrams
  return { knownGrossGrams, withoutWeight: cylinders.length - known.length, tooHeavy, otherGrams, allGrams, leftGrams, isOver: leftGrams < 0 }
}

/** What the scale would show; null where tare or contents are not known. */
export function grossGrams({ tareWeightGrams, netGrams }: Aboard): number | null {
  return tareWeightGrams === null || netGrams === null ? null : tareWeightGrams + netGrams
}
