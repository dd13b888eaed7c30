import { exactGrams } from '../quantity/mass'
import { liquidDensityAt } from '../refrigerant/saturation'
import type { Catalogue, Refrigerant } from '../refrigerant/types'
import { markedPressurePsig } from './fillingDensities'
import { fillingDensity } from './rules/fillingDensity'
import { hotCeiling } from './rules/hotCeiling'
import { hotPressure } from './rules/hotPressure'
import { liquid130F } from './rules/liquid130F'
import { liquid77F } from './rules/liquid77F'
import { oily } from './rules/oily'
import type { RuleFigure, RuleInput } from './rules/ruleInput'
import { HOT_REFERENCE_C, isLiquidWhenHot, volumeLitres } from './rules/ruleInput'
import { resultText } from './rules/sumText'
import { unRatio } from './rules/unRatio'
import { waterWeight } from './rules/waterWeight'
import { tareInForceGrams } from './stopWeight'
import type { Condition, FillLimit, FillPolicy, FillRule, FillTerm, MissingInput, Stamp, TermStanding } from './types'
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

// R-744 is exempt from the 5/4 rule (49 CFR 173.301a(d)(1)) and from "not liquid full" (173.304(b)): its row alone decides.
const DECIDED_BY_ITS_ROW = 'R-744'

const RULES: Readonly<Record<FillRule, (input: RuleInput) => RuleFigure>> = {
  'water-weight': waterWeight,
  'liquid-77F': liquid77F,
  'filling-density': fillingDensity,
  'hot-ceiling': hotCeiling,
  'liquid-130F': liquid130F,
  'un-ratio': unRatio,
  'oily': oily,
  'hot-pressure': hotPressure,
}

type Figure = { rule: FillRule, counts: boolean, figure: RuleFigure }

/**
 * The most net weight a cylinder may hold: the lowest of the rules in force, each shown with its sum and its source.
 *
 * Units: net grams; `exactLimitGrams` unrounded.
 * Rounding: down.
 * Errors: none; where an input is not known there is no figure and `missing` names it.
 */
export function fillLimit(input: FillLimitInput): FillLimit {
  const refrigerant = knownRefrigerant(input)
  const missing = missingInputs(input, refrigerant)
  const { waterCapacity } = input.stamp
  if (!refrigerant || !waterCapacity) return noLimit([], missing)

  const ruleInput: RuleInput = {
    waterCapacity,
    waterCapacityGrams: exactGrams(waterCapacity),
    volumeLitres: volumeLitres(waterCapacity),
    cylinder: input.stamp,
    refrigerant,
    supercritical: input.catalogue.supercritical.get(refrigerant.designation) ?? null,
    policy: cappedPolicy(input.policy),
  }
  const figures = rulesFor(ruleInput, input.burnt || input.condition === 'burnt')
    .map(({ rule, counts }) => ({ rule, counts, figure: RULES[rule](ruleInput) }))
  const hot = hotBounds(ruleInput)
  const terms = figures.map(figure => termOf(figure, hot, ruleInput))
  const lowest = lowestInForce(figures, hot)
  if (!lowest || missing.includes('tareWeight') || lacksDecisiveFigure(figures, refrigerant)) return noLimit(terms, missing)
  return {
    governingRule: lowest.rule,
    exactLimitGrams: lowest.exactGrams,
    fillLimitGrams: Math.floor(lowest.exactGrams),
    terms,
    missing,
  }
}

function knownRefrigerant(input: FillLimitInput): Refrigerant | null {
  if (input.refrigerant === null || input.condition === 'mixed' || input.condition === 'unknown') return null
  return input.catalogue.refrigerants.get(input.refrigerant) ?? null
}

function missingInputs(input: FillLimitInput, refrigerant: Refrigerant | null): MissingInput[] {
  const missing: MissingInput[] = []
  if (tareInForceGrams(input.stamp, input.tareGrams) === null) missing.push('tareWeight')
  if (input.stamp.waterCapacity === null) missing.push('waterCapacity')
  if (markedPressurePsig(input.stamp) === null) missing.push('servicePressure')
  if (refrigerant === null) missing.push('refrigerant')
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

function rulesFor(input: RuleInput, burnt: boolean): { rule: FillRule, counts: boolean }[] {
  const byRow = input.refrigerant.designation === DECIDED_BY_ITS_ROW
  return [
    { rule: 'water-weight' as const, counts: !byRow },
    { rule: 'liquid-77F' as const, counts: !byRow },
    { rule: 'filling-density' as const, counts: true },
    { rule: 'hot-ceiling' as const, counts: !byRow },
    ...isLiquidWhenHot(input.refrigerant) ? [] : [{ rule: 'hot-pressure' as const, counts: !byRow }],
    { rule: 'liquid-130F' as const, counts: !byRow && input.policy.options.liquid130F },
    { rule: 'un-ratio' as const, counts: !byRow && input.policy.options.unRatio },
    ...burnt ? [{ rule: 'oily' as const, counts: !byRow }] : [],
  ]
}

type HotBounds = { ceilingGrams: number, liquidFullGrams: number } | null

function hotBounds(input: RuleInput): HotBounds {
  if (!isLiquidWhenHot(input.refrigerant)) return null
  const liquidFullGrams = input.volumeLitres * liquidDensityAt(input.refrigerant, HOT_REFERENCE_C)
  return { liquidFullGrams, ceilingGrams: liquidFullGrams * input.policy.ceilingThousandths / 1000 }
}

function standingOf({ rule, counts, figure }: Figure, hot: HotBounds): TermStanding {
  if (hot && figure.exactGrams !== null && rule !== 'hot-ceiling') {
    if (figure.exactGrams > hot.liquidFullGrams) return 'unsafe'
    if (figure.exactGrams > hot.ceilingGrams) return 'above-margin'
  }
  return counts ? 'in-force' : 'compared'
}

function termOf(entry: Figure, hot: HotBounds, input: RuleInput): FillTerm {
  const { rule, figure } = entry
  const standing = standingOf(entry, hot)
  if (figure.exactGrams === null) {
    return { rule, limitGrams: null, because: figure.because, standing, working: '', source: figure.source }
  }
  if (standing === 'unsafe') {
    const because = `unsafe for ${input.refrigerant.designation}: liquid-full below 131 °F`
    return { rule, limitGrams: null, because, standing, working: figure.sum, source: figure.source }
  }
  const working = `${figure.sum} = ${resultText(figure.exactGrams, input.waterCapacity)}`
  const because = standing === 'above-margin' ? { because: 'above our margin below liquid-full at 131 °F' } : {}
  return { rule, limitGrams: Math.floor(figure.exactGrams), ...because, standing, working, source: figure.source }
}

function lowestInForce(figures: Figure[], hot: HotBounds): { rule: FillRule, exactGrams: number } | null {
  let lowest: { rule: FillRule, exactGrams: number } | null = null
  for (const entry of figures) {
    const { exactGrams: grams } = entry.figure
    if (grams === null || standingOf(entry, hot) !== 'in-force') continue
    if (lowest === null || grams < lowest.exactGrams) lowest = { rule: entry.rule, exactGrams: grams }
  }
  return lowest
}

// Without the figure that guards it, no other rule may speak for a fluid.
function lacksDecisiveFigure(figures: Figure[], refrigerant: Refrigerant): boolean {
  const hasNone = (rule: FillRule) => figures.some(entry => entry.rule === rule && entry.counts && entry.figure.exactGrams === null)
  if (refrigerant.designation === DECIDED_BY_ITS_ROW) return hasNone('filling-density')
  if (!isLiquidWhenHot(refrigerant)) return hasNone('hot-pressure')
  return hasNone('hot-ceiling') || hasNone('un-ratio')
}

function noLimit(terms: FillTerm[], missing: MissingInput[]): FillLimit {
  return { governingRule: null, exactLimitGrams: null, fillLimitGrams: null, terms, missing }
}
