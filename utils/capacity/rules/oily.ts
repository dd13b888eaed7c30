import { volumeFactor } from './factors'
import { liquidShareOfVolume } from './liquidShare'
import type { RuleFigure, RuleInput } from './ruleInput'

// 0.75 kg/L published for R-22 with compressor oil, over its liquid density at 50 C of 1.082 kg/L.
const SHARE_WITH_OIL_THOUSANDTHS = 690

// Published for these themselves, with compressor oil. Units: kg/L.
const PUBLISHED_WITH_OIL: ReadonlyMap<string, number> = new Map([['R-12', 0.75]])
const PUBLISHED_SOURCE = 'TRG 102 annex (German, repealed)'

/**
 * The lower limit for refrigerant that carries oil, which is lighter: it takes more volume than its weight tells.
 *
 * Where a figure is published for the refrigerant itself, the lower of both holds.
 *
 * Source: TRG 102, annex (German technical rules for pressure gases, repealed): 0.75 kg/L for R-22 and for R-12 with oil;
 * carrying the ratio of R-22 over to other refrigerants is ours.
 */
export function oily(input: RuleInput): RuleFigure {
  const byShare = liquidShareOfVolume(input, {
    shareThousandths: SHARE_WITH_OIL_THOUSANDTHS,
    tC: 50,
    source: 'TRG 102 annex (German, repealed): 0.75 kg/L for R-22 with oil; carrying its ratio over to others is ours',
  })
  const { fluid, volumeLitres } = input
  const published = PUBLISHED_WITH_OIL.get(fluid.designation)
  if (published === undefined) return byShare
  const exactGrams = volumeLitres * published * 1000
  if (byShare.exactGrams !== null && byShare.exactGrams <= exactGrams) return byShare
  const note = `printed for ${fluid.designation} with oil`
  return {
    exactGrams,
    factors: [volumeFactor(volumeLitres), { name: 'filling-ratio', value: published, unit: 'kg/L', note, source: PUBLISHED_SOURCE }],
    source: `${PUBLISHED_SOURCE}: ${published} kg/L for ${fluid.designation} with oil`,
  }
}
