import { exactGrams } from '../quantity/mass'
import { idealMixture } from '../refrigerant/idealMixture'
import type { Catalogue, LiquidTable } from '../refrigerant/types'
import { markedPressurePsig } from './fillingDensities'
import { fillTerm, hotBounds, standingOf, termsWithoutFigure } from './fillTerm'
import type { RuleInput } from './rules/ruleInput'
import { volumeLitres } from './rules/ruleInput'
import { lacksGuard, ruleAnswers } from './rulesInForce'
import { tareInForceGrams } from './stopWeight'
import type { Condition, FillLimit, FillPolicy, FillRule, FillTerm, MissingInput, Stamp } from './types'
import { DEFAULT_FILL_POLICY } from './types'

/** What a fill limit rests on: the stamp, what is or shall be in the cylinder, and the firm's rule. */
export type FillLimitInput = {
  stamp: Stamp
  refrigerant: string | null
  condition: Condition
  /** Once burnt, burnt until a deep vacuum, whatever the condition's word. */
  burnt: boolean
  policy: FillPolicy
  catalogue: Catalogue
  /** The tare in force where a retest set a new one. */
  tareGrams?: number | null
}

/**
 * The most net weight a cylinder may hold: the lowest of the rules in force. Every rule is listed, with its sum and its
 * source or with why it has none.
 *
 * Units: net grams; `exactLimitGrams` unrounded.
 * Rounding: down.
 * Errors: none; where an input is not known there is no figure and `missing` names it.
 */
export function fillLimit(input: FillLimitInput): FillLimit {
  const known = knownFluid(input)
  const fluid = 'fluid' in known ? known.fluid : null
  const missing = missingInputs(input, fluid)
  const { waterCapacity } = input.stamp
  if ('because' in known) return withoutFigure(termsWithoutFigure(known.because), missing)
  if (!waterCapacity) return withoutFigure(termsWithoutFigure('the water capacity is not known'), missing)

  const ruleInput: RuleInput = {
    waterCapacity,
    waterCapacityGrams: exactGrams(waterCapacity),
    volumeLitres: volumeLitres(waterCapacity),
    cylinder: input.stamp,
    fluid: known.fluid,
    supercritical: input.catalogue.supercritical.get(known.fluid.designation) ?? null,
    policy: cappedPolicy(input.policy),
  }
  const answers = ruleAnswers(ruleInput, input.burnt || input.condition === 'burnt')
  const bounds = hotBounds(ruleInput, answers)
  const terms: FillTerm[] = []
  let lowest: { rule: FillRule, exactGrams: number } | null = null
  for (const answer of answers) {
    const standing = standingOf(answer, bounds)
    const { exactGrams: grams } = answer.figure
    terms.push(fillTerm(answer, standing, bounds))
    if (standing === 'in-force' && grams !== null && (lowest === null || grams < lowest.exactGrams)) lowest = { rule: answer.rule, exactGrams: grams }
  }
  if (!lowest || missing.includes('tareWeight') || lacksGuard(answers, known.fluid)) return withoutFigure(terms, missing)
  return {
    governingRule: lowest.rule,
    exactLimitGrams: lowest.exactGrams,
    fillLimitGrams: Math.floor(lowest.exactGrams),
    terms,
    missing,
  }
}

// What nobody has named, or what is mixed, has no density to reckon with.
function knownFluid({ refrigerant, condition, catalogue }: FillLimitInput): { fluid: LiquidTable } | { because: string } {
  if (condition === 'mixed') return { because: 'what is mixed has no density to reckon with' }
  if (refrigerant === null || condition === 'unknown') return { because: 'the refrigerant is not known' }
  const listed = catalogue.refrigerants.get(refrigerant)
  if (listed) return { fluid: listed }
  const composition = catalogue.compositions.get(refrigerant)
  return composition ? idealMixture(composition, catalogue) : { because: `no liquid density is held for ${refrigerant}` }
}

function missingInputs(input: FillLimitInput, fluid: LiquidTable | null): MissingInput[] {
  const missing: MissingInput[] = []
  if (tareInForceGrams(input.stamp, input.tareGrams) === null) missing.push('tareWeight')
  if (input.stamp.waterCapacity === null) missing.push('waterCapacity')
  if (markedPressurePsig(input.stamp) === null) missing.push('servicePressure')
  if (fluid === null) missing.push('refrigerant')
  return missing
}

// A firm may only be stricter; a figure above the default must never reach a limit.
function cappedPolicy(policy: FillPolicy): FillPolicy {
  return {
    shareThousandths: Math.min(policy.shareThousandths, DEFAULT_FILL_POLICY.shareThousandths),
    ceilingThousandths: Math.min(policy.ceilingThousandths, DEFAULT_FILL_POLICY.ceilingThousandths),
    options: policy.options,
  }
}

function withoutFigure(terms: FillTerm[], missing: MissingInput[]): FillLimit {
  return { governingRule: null, exactLimitGrams: null, fillLimitGrams: null, terms, missing }
}
