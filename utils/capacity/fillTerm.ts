import { liquidDensityAt } from '../refrigerant/saturation'
import type { RuleInput } from './rules/ruleInput'
import { HOT_REFERENCE_C, isLiquidWhenHot } from './rules/ruleInput'
import type { RuleAnswer } from './rulesInForce'
import { FILL_RULES } from './rulesInForce'
import type { FillTerm, TermStanding } from './types'

/** What no figure may pass when a cylinder is hot, and why. Units: net grams, unrounded. */
export type HotBounds = { ceilingGrams: number, unsafeAboveGrams: number, unsafeBecause: string }

/**
 * The bounds of a cylinder when hot: liquid-full at 131 F and the ceiling below it for a liquid, the service pressure for a gas.
 *
 * Returns null where a row alone decides. Source: 49 CFR 173.304(b), 173.301a(c), (d).
 */
export function hotBounds(input: RuleInput, answers: readonly RuleAnswer[]): HotBounds | null {
  const { designation } = input.fluid
  if (isLiquidWhenHot(input.fluid)) {
    const liquidFullGrams = input.volumeLitres * liquidDensityAt(input.fluid, HOT_REFERENCE_C)
    return {
      ceilingGrams: liquidFullGrams * input.policy.ceilingThousandths / 1000,
      unsafeAboveGrams: liquidFullGrams,
      unsafeBecause: `unsafe for ${designation}: liquid-full below 131 °F`,
    }
  }
  const hotPressure = answers.find(answer => answer.rule === 'hot-pressure')
  if (!hotPressure?.counts) return null
  const boundGrams = hotPressure.figure.exactGrams ?? 0
  return {
    ceilingGrams: boundGrams,
    unsafeAboveGrams: boundGrams,
    unsafeBecause: `unsafe for ${designation}: its pressure would pass what the cylinder may stand`,
  }
}

/** How a rule's figure stands for a cylinder. */
export function standingOf({ rule, counts, figure }: RuleAnswer, bounds: HotBounds | null): TermStanding {
  if (bounds && figure.exactGrams !== null && rule !== 'hot-ceiling') {
    if (figure.exactGrams > bounds.unsafeAboveGrams) return 'unsafe'
    if (figure.exactGrams > bounds.ceilingGrams) return 'above-margin'
  }
  return counts ? 'in-force' : 'compared'
}

/** A rule's answer as it is listed: with what it is the product of, and without a figure where that would be unsafe. Rounding: down. */
export function fillTerm({ rule, figure }: RuleAnswer, standing: TermStanding, bounds: HotBounds | null): FillTerm {
  if (figure.exactGrams === null) return { rule, limitGrams: null, because: figure.because, standing, factors: [], source: figure.source }
  const { exactGrams, factors, source } = figure
  if (bounds && standing === 'unsafe') return { rule, limitGrams: null, because: bounds.unsafeBecause, standing, factors, source }
  const limitGrams = Math.floor(exactGrams)
  return standing === 'above-margin'
    ? { rule, limitGrams, because: 'above our margin: over the hot ceiling at 131 °F', standing, factors, source }
    : { rule, limitGrams, standing, factors, source }
}

/** Every rule without a figure, for one reason that holds for all. */
export function termsWithoutFigure(because: string): FillTerm[] {
  return FILL_RULES.map(rule => ({ rule, limitGrams: null, because, standing: 'compared', factors: [], source: '' }))
}
