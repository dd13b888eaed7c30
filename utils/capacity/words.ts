import type { FillRule } from './types'

/** The rules of the fill limit, as the end of "Limit by ...". */
export const RULE_WORDS: Record<FillRule, string> = {
  'water-weight': 'water weight',
  'liquid-77F': 'liquid at 77 °F',
  'filling-density': 'filling density',
  'hot-ceiling': 'the hot ceiling, liquid at 131 °F',
  'liquid-130F': 'liquid at 130 °F',
  'un-ratio': 'the UN filling ratio',
  'oily': 'oily refrigerant',
  'hot-pressure': 'the pressure at 131 °F and at 70 °F',
}

/**
 * A rule with the share it takes, where it takes one.
 *
 * @example ruleWithShare('water-weight', 0.8) // 'water weight, 0.80 × WC'
 */
export function ruleWithShare(rule: FillRule, share: number): string {
  return rule === 'water-weight' ? `${RULE_WORDS[rule]}, ${share.toFixed(2)} × WC` : RULE_WORDS[rule]
}
