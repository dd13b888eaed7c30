import { liquidShareOfVolume } from './liquidShare'
import type { RuleFigure, RuleInput } from './ruleInput'

/**
 * A share of the volume as liquid at 77 F (25 C).
 *
 * Source: AHRI Guideline K-2004, as reported in ACHR News, "On the Level: Filling Cylinders". The guideline takes a printed
 * specific gravity times the water capacity; with its 1.197 for R-22 the result is 0.43 % higher than ours.
 */
export function liquid77F(input: RuleInput): RuleFigure {
  return liquidShareOfVolume(input, {
    shareThousandths: input.policy.shareThousandths,
    tC: 25,
    source: 'AHRI Guideline K-2004, as reported in ACHR News, "On the Level: Filling Cylinders"',
  })
}
