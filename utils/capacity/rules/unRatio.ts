import { hasLiquidAt, liquidDensityAt } from '../../refrigerant/saturation'
import type { Factor } from '../types'
import { volumeFactor, withError } from './factors'
import type { RuleFigure, RuleInput } from './ruleInput'

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
  const { fluid } = input
  const published = PUBLISHED_RATIOS.get(fluid.designation)
  if (published !== undefined) return ratioFigure(input, ratioFactor(published, `printed for ${fluid.designation}`, PUBLISHED_SOURCE))
  if (!hasLiquidAt(fluid, 60)) {
    return { exactGrams: null, because: `${fluid.designation} has no liquid at 60 °C, or no figure for it`, source: SOURCE }
  }
  const at50C = 0.95 * liquidDensityAt(fluid, 50)
  const at60C = liquidDensityAt(fluid, 60)
  const derated = fluid.derate === undefined ? '' : ', each less the derate for ideal mixing'
  const note = `the lower of 0.95 × liquid at 50 °C and liquid at 60 °C${derated}`
  const ratio = ratioFactor(Math.min(at50C, at60C) / 1000, note, `${SOURCE}; density: ${fluid.source}`)
  return ratioFigure(input, withError(ratio, fluid))
}

function ratioFactor(kgPerLitre: number, note: string, source: string): Factor {
  return { name: 'filling-ratio', value: kgPerLitre, unit: 'kg/L', note, source }
}

function ratioFigure({ volumeLitres }: RuleInput, ratio: Factor): RuleFigure {
  return { exactGrams: volumeLitres * ratio.value * 1000, factors: [volumeFactor(volumeLitres), ratio], source: ratio.source ?? SOURCE }
}
