import { productGrams } from '../capacity/rules/factors'
import type { FillRule, FillTerm, TermStanding } from '../capacity/types'
import { RULE_WORDS } from '../capacity/words'
import { formatMass, type MassUnit } from '../quantity/mass'
import { scaleTicks, type BeamTick } from './beam'
import { standingWords } from './ruleAccount'

/** One rule on the common scale; `at` is its limit's place from the left in percent, null where it has no figure to show. */
export type RuleMark = { rule: FillRule, title: string, at: number | null, figure: string, governs: boolean, standing: TermStanding }

/** All rules of a fill limit on one straight scale of net weight. */
export type RuleScale = {
  marks: RuleMark[]
  /** From where on the cylinder would be liquid-full at 131 F, in percent; null where no liquid is reckoned with. */
  liquidFullFrom: number | null
  /** The same as a weight, in words. */
  liquidFull: string | null
  ticks: BeamTick[]
  /** The same numbers as a line of text. */
  text: string
}

// What lies past liquid-full is drawn, but needs no more room than to be seen.
const BEYOND = 1.1

/** Lays out the rules on one scale from nothing in it to past liquid-full, the governing one first. Rounding: down. */
export function layOutRules(terms: readonly FillTerm[], governingRule: FillRule | null, unit: MassUnit): RuleScale | null {
  const most = Math.max(0, ...terms.map(term => term.limitGrams ?? 0))
  const liquidFullGrams = liquidFullWhenHotGrams(terms)
  const endGrams = Math.max(most, liquidFullGrams ?? 0) * BEYOND
  if (endGrams === 0) return null
  const place = (grams: number) => grams / endGrams * 100
  const full = liquidFullGrams === null ? null : formatMass(liquidFullGrams, unit, 'down')
  const marks = governingFirst(terms, governingRule).map(term => ({
    rule: term.rule,
    title: RULE_WORDS[term.rule],
    at: term.limitGrams === null ? null : place(term.limitGrams),
    figure: term.limitGrams === null ? standingWords(term)?.text ?? 'no figure' : formatMass(term.limitGrams, unit, 'down'),
    governs: term.rule === governingRule,
    standing: term.standing,
  }))
  return {
    marks,
    liquidFullFrom: liquidFullGrams === null ? null : place(liquidFullGrams),
    liquidFull: full,
    ticks: scaleTicks(0, endGrams, unit, place, ({ at }) => at < 91),
    text: [
      ...marks.map(({ title, figure, governs }) => `${title} ${figure}${governs ? ', governs' : ''}`),
      ...full === null ? [] : [`liquid-full at 131 °F ${full}`],
    ].join('; '),
  }
}

/** The weight that leaves no vapor at 131 F: what the hot ceiling takes its share of; null where there is none. Units: net grams. */
function liquidFullWhenHotGrams(terms: readonly FillTerm[]): number | null {
  const ceiling = terms.find(term => term.rule === 'hot-ceiling' && term.factors.length > 0)
  return ceiling ? productGrams(ceiling.factors.filter(factor => factor.name !== 'share')) : null
}

/** Whether any rule has something to show; without a refrigerant or a volume none has. */
export function anySpeaks(terms: readonly FillTerm[]): boolean {
  return terms.some(term => term.limitGrams !== null || term.standing === 'unsafe')
}

/** The rules in their order, the one that governs before all others. */
export function governingFirst(terms: readonly FillTerm[], governingRule: FillRule | null): FillTerm[] {
  return [...terms].sort((a, b) => Number(b.rule === governingRule) - Number(a.rule === governingRule))
}
