import { celsiusFromFahrenheit } from '../../quantity/temperature'
import { liquidShareOfVolume } from './liquidShare'
import type { RuleFigure, RuleInput } from './ruleInput'

/**
 * A share of the volume as liquid at 130 F, for cylinders that ride in a hot van.
 *
 * Source: taught form of the 80 % rule at 130 F, HVAC School, articles on recovery.
 */
export function liquid130F(input: RuleInput): RuleFigure {
  return liquidShareOfVolume(input, {
    shareThousandths: input.policy.shareThousandths,
    tC: celsiusFromFahrenheit(130),
    source: 'taught form of the 80 % rule at 130 °F, HVAC School, articles on recovery',
  })
}
