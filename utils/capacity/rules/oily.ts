import { liquidShareOfVolume } from './liquidShare'
import type { RuleFigure, RuleInput } from './ruleInput'

// 0.75 kg/L published for R-22 with compressor oil, over its liquid density at 50 C of 1.082 kg/L.
const SHARE_WITH_OIL_THOUSANDTHS = 690

/**
 * The lower limit for refrigerant that carries oil, which is lighter: it takes more volume than its weight tells.
 *
 * Source: TRG 102, annex (German technical rules for pressure gases, repealed): 0.75 kg/L for R-22 with oil; carrying the
 * ratio over to other refrigerants is ours.
 */
export function oily(input: RuleInput): RuleFigure {
  return liquidShareOfVolume(input, {
    shareThousandths: SHARE_WITH_OIL_THOUSANDTHS,
    tC: 50,
    source: 'TRG 102 annex (German, repealed): 0.75 kg/L for R-22 with oil; carrying its ratio over to others is ours',
  })
}
