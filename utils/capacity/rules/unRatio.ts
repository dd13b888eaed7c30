import { hasLiquidAt, liquidDensityAt } from '../../refrigerant/saturation'
import type { RuleFigure, RuleInput } from './ruleInput'
import { litresText } from './sumText'

const SOURCE = '49 CFR 173.304b(b)'

// Read in the table of portable tanks; the formula has no density at 60 C for these.
const PUBLISHED_RATIOS: ReadonlyMap<string, number> = new Map([['R-125', 0.87]])
const PUBLISHED_SOURCE = '49 CFR 173.313, portable tank instruction T50'

/**
 * The filling ratio of the UN model regulations, for metric regions: at most 95 % liquid at 50 C and not liquid-full at 60 C.
 *
 * Source: 49 CFR 173.304b(b); R-125 by 49 CFR 173.313.
 */
export function unRatio(input: RuleInput): RuleFigure {
  const { refrigerant, volumeLitres } = input
  const published = PUBLISHED_RATIOS.get(refrigerant.designation)
  if (published !== undefined) return ratioFigure(volumeLitres, published, `${published} kg/L`, PUBLISHED_SOURCE)
  if (!hasLiquidAt(refrigerant, 60)) {
    return { exactGrams: null, because: `${refrigerant.designation} has no liquid at 60 °C, or no figure for it`, source: SOURCE }
  }
  const kgPerLitre = Math.min(0.95 * liquidDensityAt(refrigerant, 50), liquidDensityAt(refrigerant, 60)) / 1000
  const terms = `${kgPerLitre.toFixed(4)} kg/L (the lower of 0.95 × liquid at 50 °C and liquid at 60 °C)`
  return ratioFigure(volumeLitres, kgPerLitre, terms, `${SOURCE}; density: ${refrigerant.source}`)
}

function ratioFigure(volumeLitres: number, kgPerLitre: number, ratio: string, source: string): RuleFigure {
  return { exactGrams: volumeLitres * kgPerLitre * 1000, sum: `${litresText(volumeLitres)} × ${ratio}`, source }
}
