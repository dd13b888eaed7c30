import { bubblePressureAt, liquidDensityAt, vapourDensityAt } from '../refrigerant/saturation'
import type { Refrigerant } from '../refrigerant/types'

/** How a net weight stands in a cylinder at a temperature. */
export type TwoPhase = {
  phase: 'two-phase' | 'liquid-full' | 'vapour'
  /** Share of the volume that is liquid, 0 to 1. */
  liquidShare: number
  liquidGrams: number
  vapourGrams: number
  /** Bubble pressure while liquid and vapour share the cylinder; null where one alone fills it. Units: kPa absolute. */
  pressureKPa: number | null
}

/**
 * How much of a cylinder is liquid and how much vapour at a temperature: the share of the volume at which both together
 * weigh what is in it.
 *
 * Liquid at its bubble point, vapour at its dew point, both of the blend as formulated: for a blend with glide an
 * approximation, since what boils off first is richer in its light parts.
 * Units: net grams, litres, C.
 * Errors: RangeError outside the refrigerant's table, for a net below 0 and for a volume that is not above 0.
 */
export function twoPhase(input: { netGrams: number, volumeLitres: number, refrigerant: Refrigerant, tC: number }): TwoPhase {
  const { netGrams, volumeLitres, refrigerant, tC } = input
  if (!(netGrams >= 0 && volumeLitres > 0)) throw new RangeError(`No ${netGrams} g fill ${volumeLitres} L`)
  const liquidDensity = liquidDensityAt(refrigerant, tC)
  const vapourDensity = vapourDensityAt(refrigerant, tC)
  // Grams per litre are kilograms per cubic metre.
  const density = netGrams / volumeLitres
  if (density >= liquidDensity) return { phase: 'liquid-full', liquidShare: 1, liquidGrams: netGrams, vapourGrams: 0, pressureKPa: null }
  if (density <= vapourDensity) return { phase: 'vapour', liquidShare: 0, liquidGrams: 0, vapourGrams: netGrams, pressureKPa: null }
  const liquidShare = (density - vapourDensity) / (liquidDensity - vapourDensity)
  return {
    phase: 'two-phase',
    liquidShare,
    liquidGrams: liquidShare * volumeLitres * liquidDensity,
    vapourGrams: (1 - liquidShare) * volumeLitres * vapourDensity,
    pressureKPa: bubblePressureAt(refrigerant, tC),
  }
}
