import { liquidShareOfVolume } from './liquidShare'
import type { RuleFigure, RuleInput } from './ruleInput'
import { HOT_REFERENCE_C } from './ruleInput'

/**
 * The ceiling over every other rule: a share below the weight that would leave the cylinder liquid-full at 131 F (55 C).
 *
 * Source: 49 CFR 173.304(b) asks that the liquid never fills the cylinder up to 131 F; the margin below that is ours.
 */
export function hotCeiling(input: RuleInput): RuleFigure {
  return liquidShareOfVolume(input, {
    shareThousandths: input.policy.ceilingThousandths,
    tC: HOT_REFERENCE_C,
    source: '49 CFR 173.304(b): never liquid-full up to 131 °F; the margin below that is ours',
  })
}
