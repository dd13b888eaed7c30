import { fillingDensity } from './rules/fillingDensity'
import { hotCeiling } from './rules/hotCeiling'
import { hotPressure } from './rules/hotPressure'
import { liquid130F } from './rules/liquid130F'
import { liquid77F } from './rules/liquid77F'
import { oily } from './rules/oily'
import type { RuleFigure, RuleInput } from './rules/ruleInput'
import { isLiquidWhenHot } from './rules/ruleInput'
import { unRatio } from './rules/unRatio'
import { waterWeight } from './rules/waterWeight'
import type { FillRule } from './types'

/** A rule's figure for one cylinder, and whether it counts or is only shown beside the others. */
export type RuleAnswer = { rule: FillRule, counts: boolean, figure: RuleFigure }

const RULES: Readonly<Record<FillRule, (input: RuleInput) => RuleFigure>> = {
  'water-weight': waterWeight,
  'liquid-77F': liquid77F,
  'filling-density': fillingDensity,
  'hot-ceiling': hotCeiling,
  'hot-pressure': hotPressure,
  'liquid-130F': liquid130F,
  'un-ratio': unRatio,
  'oily': oily,
}

// Exempt from the 5/4 rule (49 CFR 173.301a(d)(1)) and from "never liquid-full" (173.304(b)): its row alone decides.
const DECIDED_BY_ITS_ROW = 'R-744'

/** What every rule that speaks for a refrigerant gives; the oily one only where it has been burnt. */
export function ruleAnswers(input: RuleInput, burnt: boolean): RuleAnswer[] {
  return rulesFor(input, burnt).map(({ rule, counts }) => ({ rule, counts, figure: RULES[rule](input) }))
}

/**
 * Whether a rule that guards a fluid has no figure for it, so that no other rule may speak.
 *
 * That is its row for R-744, the hot pressure for a gas, and the filling ratio where the firm has chosen it.
 */
export function lacksGuard(answers: readonly RuleAnswer[], input: RuleInput): boolean {
  const guards: FillRule[] = input.refrigerant.designation === DECIDED_BY_ITS_ROW
    ? ['filling-density']
    : isLiquidWhenHot(input.refrigerant) ? ['hot-ceiling', 'un-ratio'] : ['hot-pressure']
  return answers.some(({ rule, counts, figure }) => counts && guards.includes(rule) && figure.exactGrams === null)
}

function rulesFor(input: RuleInput, burnt: boolean): { rule: FillRule, counts: boolean }[] {
  if (input.refrigerant.designation === DECIDED_BY_ITS_ROW) return [{ rule: 'filling-density', counts: true }]
  const { options } = input.policy
  return [
    { rule: 'water-weight', counts: true },
    { rule: 'liquid-77F', counts: true },
    { rule: 'filling-density', counts: true },
    { rule: isLiquidWhenHot(input.refrigerant) ? 'hot-ceiling' : 'hot-pressure', counts: true },
    { rule: 'liquid-130F', counts: options.liquid130F },
    { rule: 'un-ratio', counts: options.unRatio },
    ...burnt ? [{ rule: 'oily' as const, counts: true }] : [],
  ]
}
