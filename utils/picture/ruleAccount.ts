import type { Factor, FillRule, FillTerm } from '../capacity/types'
import { RULE_WORDS } from '../capacity/words'
import { formatFigure, formatMass, formatReading, hundredthsText, type MassUnit } from '../quantity/mass'
import { fahrenheitFromCelsius } from '../quantity/temperature'
import type { StatusKind } from './status'

/** One line of an account: what stands at its left, the figure with decimals that line up, its unit. */
export type AccountLine = { sign: '' | '×' | '=', words: string, note: string | null, figure: string, unit: string, isResult: boolean }

/** One rule set like an account: its factors one under the other, their product, and what is left of it when rounded. */
export type RuleAccount = {
  rule: FillRule
  title: string
  governs: boolean
  /** How it stands, in a few words, and the status that this is; null where it is simply in force. */
  standing: { text: string, kind: StatusKind | null } | null
  /** The limit as a scale shows it; null where there is none to show. */
  limit: string | null
  lines: AccountLine[]
  because: string | null
  source: string
}

const FACTOR_WORDS: Record<Factor['name'], string> = {
  'share': 'share',
  'water-capacity': 'water capacity, WC',
  'volume': 'volume',
  'liquid-density': 'density of the liquid',
  'filling-density': 'percent of WC',
  'filling-ratio': 'filling ratio',
  'density-at-pressure': 'density that reaches the pressure',
  'derate': 'taken off for the estimate',
}

/** Decimals of a factor that is worked out; one that is set or stamped stands as it is. */
const DECIMALS: Partial<Record<Factor['name'], number>> = { 'volume': 2, 'liquid-density': 4, 'density-at-pressure': 4 }
const MOST_DECIMALS = 4

const FIGURE_SPACE = '\u2007'

/** A rule of a fill limit as an account, in the reader's unit. Rounding: the product down to two decimals, the limit down. */
export function ruleAccount(term: FillTerm, governingRule: FillRule | null, unit: MassUnit): RuleAccount {
  const governs = term.rule === governingRule
  const lines = [...term.factors.map((factor, index) => factorLine(factor, index, term.source)), ...resultLines(term, unit)]
  const aligned = alignDecimals(lines.map(line => line.figure))
  return {
    rule: term.rule,
    title: RULE_WORDS[term.rule],
    governs,
    standing: governs ? { text: 'governs', kind: 'ok' } : standingWords(term),
    limit: term.limitGrams === null ? null : formatMass(term.limitGrams, unit, 'down'),
    lines: lines.map((line, index) => ({ ...line, figure: aligned[index]! })),
    because: term.because ?? null,
    source: term.source,
  }
}

/** Accounts with those that say nothing, for one and the same reason, under one title where the first of them stood. */
export function silentTogether(accounts: readonly RuleAccount[]): RuleAccount[] {
  const saysTheSame = (a: RuleAccount, b: RuleAccount) => isSilent(a) && isSilent(b) && a.because === b.because && a.source === b.source
  return accounts.flatMap((account, index) => {
    const alike = accounts.filter(other => other === account || saysTheSame(other, account))
    return accounts.indexOf(alike[0]!) === index ? [{ ...account, title: alike.map(({ title }) => title).join('; ') }] : []
  })
}

function isSilent({ limit, lines, because }: RuleAccount): boolean {
  return limit === null && lines.length === 0 && because !== null
}

/** How a rule that does not govern stands, in a few words. */
export function standingWords({ rule, standing, limitGrams }: FillTerm): RuleAccount['standing'] {
  if (standing === 'unsafe') return { text: 'unsafe for this refrigerant', kind: 'stop' }
  if (standing === 'above-margin') return { text: 'above our margin', kind: 'att' }
  if (limitGrams === null) return { text: 'no figure', kind: 'unk' }
  if (standing === 'in-force') return null
  if (rule === 'oily') return { text: 'not in force: only when burnt', kind: null }
  if (rule === 'liquid-130F' || rule === 'un-ratio') return { text: 'not in force: option off', kind: null }
  return { text: 'not in force: to compare', kind: null }
}

/** Figures filled up at their right so that their decimal points stand under one another in a right-aligned column. */
export function alignDecimals(figures: readonly string[]): string[] {
  const tail = (figure: string) => /^\S*\d\.(\d+)$/.exec(figure)?.[1]?.length ?? -1
  const longest = Math.max(-1, ...figures.map(tail))
  return figures.map(figure => /\s/.test(figure) ? figure : figure + FIGURE_SPACE.repeat(longest - tail(figure)))
}

// A source that stands under the account is not said again at its factor.
function factorLine(factor: Factor, index: number, termSource: string): AccountLine {
  const source = factor.source && !termSource.includes(factor.source) ? factor.source : ''
  return {
    sign: index === 0 ? '' : '×',
    words: FACTOR_WORDS[factor.name],
    note: [factor.atC === undefined ? '' : `at ${Math.round(fahrenheitFromCelsius(factor.atC))}\u00A0°F`, factor.note, source].filter(Boolean).join(', ') || null,
    figure: factorFigure(factor),
    unit: factor.unit,
    isResult: false,
  }
}

function factorFigure({ name, value, unit }: Factor): string {
  if (unit === 'lb' || unit === 'kg') return formatReading({ unit, value }).split('\u00A0')[0]!
  const decimals = DECIMALS[name]
  if (decimals !== undefined) return value.toFixed(decimals)
  const entered = String(Number(value.toFixed(MOST_DECIMALS)))
  return name === 'share' && entered.length < '0.00'.length ? value.toFixed(2) : entered
}

// An unsafe figure is not shown, so neither is the product that it would be rounded from.
function resultLines({ factors, limitGrams }: FillTerm, unit: MassUnit): AccountLine[] {
  if (factors.length === 0 || limitGrams === null) return []
  const own = ownUnit(factors)
  const mine = unit === 'kg' ? 'kg' : 'lb'
  const line = (sign: AccountLine['sign'], words: string, figure: string, symbol: string): AccountLine =>
    ({ sign, words, note: null, figure, unit: symbol, isResult: true })
  const { figure, symbol } = formatFigure(limitGrams, unit, 'down')
  return [
    line('=', 'together', hundredthsText(limitGrams, own), own),
    ...own === mine ? [] : [line('=', `in ${mine}`, hundredthsText(limitGrams, mine), mine)],
    line('', 'rounded down', figure, symbol),
  ]
}

function ownUnit(factors: readonly Factor[]): 'lb' | 'kg' {
  return factors.some(factor => factor.unit === 'lb') ? 'lb' : 'kg'
}
