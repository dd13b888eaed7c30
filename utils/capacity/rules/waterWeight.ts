import { shareFactor, waterCapacityFactor } from './factors'
import type { RuleFigure, RuleInput } from './ruleInput'

/**
 * A share of the water capacity, whatever the refrigerant: the form on older cylinders.
 *
 * Source: ARI Guideline K, early 1990s, as reported in ACHR News, "On the Level: Filling Cylinders".
 */
export function waterWeight(input: RuleInput): RuleFigure {
  return {
    exactGrams: input.waterCapacityGrams * input.policy.shareThousandths / 1000,
    factors: [shareFactor(input.policy.shareThousandths), waterCapacityFactor(input.waterCapacity)],
    source: 'ARI Guideline K (early 1990s), as reported in ACHR News, "On the Level: Filling Cylinders"',
  }
}
