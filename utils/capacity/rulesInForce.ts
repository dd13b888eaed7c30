import type { LiquidTable } from '../refrigerant/types'
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
import type { FillPolicy, FillRule } from './types'

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

/** Every rule, in the order in which they are listed. */
export const FILL_RULES = Object.keys(RULES) as FillRule[]

// Exempt from the 5/4 rule and from "never liquid-full": its row alone decides.
const DECIDED_BY_ITS_ROW = 'R-744'
const EXEMPTING_SOURCE = '49 CFR 173.301a(d)(1), 173.304(b)'

/** What every rule gives, also those that do not speak for a fluid; the oily one counts only where it has been burnt. */
export function ruleAnswers(input: RuleInput, burnt: boolean): RuleAnswer[] {
  if (isDecidedByItsRow(input.fluid)) return FILL_RULES.map(rule => rule === 'filling-density' ? decidingRow(input) : exempted(rule, input.fluid))
  const isLiquid = isLiquidWhenHot(input.fluid)
  return FILL_RULES.map(rule => ({ rule, counts: countsFor(rule, isLiquid, input.policy, burnt), figure: RULES[rule](input) }))
}

/**
 * Whether a rule that guards a fluid has no figure for it, so that no other rule may speak.
 *
 * That is its row for R-744, the hot pressure for a gas, and the filling ratio where the firm has chosen it.
 */
export function lacksGuard(answers: readonly RuleAnswer[], fluid: LiquidTable): boolean {
  return answers.some(({ rule, counts, figure }) => counts && figure.exactGrams === null && isGuard(rule, fluid))
}

function isGuard(rule: FillRule, fluid: LiquidTable): boolean {
  if (isDecidedByItsRow(fluid)) return rule === 'filling-density'
  return isLiquidWhenHot(fluid) ? rule === 'hot-ceiling' || rule === 'un-ratio' : rule === 'hot-pressure'
}

function countsFor(rule: FillRule, isLiquid: boolean, { options }: FillPolicy, burnt: boolean): boolean {
  switch (rule) {
    case 'hot-ceiling': return isLiquid
    case 'hot-pressure': return !isLiquid
    case 'liquid-130F': return options.liquid130F
    case 'un-ratio': return options.unRatio
    case 'oily': return burnt
    case 'water-weight':
    case 'liquid-77F':
    case 'filling-density': return true
  }
}

function isDecidedByItsRow(fluid: LiquidTable): boolean {
  return fluid.designation === DECIDED_BY_ITS_ROW
}

function decidingRow(input: RuleInput): RuleAnswer {
  return { rule: 'filling-density', counts: true, figure: fillingDensity(input) }
}

function exempted(rule: FillRule, { designation }: LiquidTable): RuleAnswer {
  const because = `${designation} is exempt from the rules at 131 °F: its row of filling densities alone decides`
  return { rule, counts: false, figure: { exactGrams: null, because, source: EXEMPTING_SOURCE } }
}
