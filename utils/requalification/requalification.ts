import type { Month } from '../quantity/month'
import { addMonths, compareMonths, daysUntilEndOfMonth, formatMonth, monthOfInstant } from '../quantity/month'
import { CHOICE_TERMS, type OwnerChoice, type RetestRules } from './ownerChoice'
import { suffixMeaning } from './retestSuffix'
import { SPECS } from './specs'
import { shortestMonths, testPeriod, type Beginning, type Steel, type TestPeriod } from './testPeriod'

/** How a cylinder was tested: by its expansion under water, under proof pressure, or by an outside look. */
export type TestMethod = 'volumetric' | 'proof' | 'visual'

/** A test date on the collar or from the custody log; without a result it is a stamp, which only a pass leaves. */
export type RequalificationMark = {
  month: Month
  method?: TestMethod
  rin?: string
  suffix?: string
  result?: 'passed' | 'rejected' | 'condemned'
}

/** Where a cylinder stands with its periodic test. */
export type Requalification = {
  lastMonth: Month | null
  intervalMonths: number | null
  dueMonth: Month | null
  state: 'in-date' | 'due-soon' | 'overdue' | 'unknown' | 'not-required'
  basis: string
  /** The owner's choice that the period is by; null where it is the regulation's shortest. */
  choice: OwnerChoice | null
}

/** What the due month rests on. */
export type RequalificationInput = {
  steel: Steel
  marks: readonly RequalificationMark[]
  nowMs: number
  timeZone: string
  rules: RetestRules
  /** Days ahead from which the test is due soon. */
  soonDays?: number
}

const DEFAULT_SOON_DAYS = 120

/**
 * When a cylinder must next be tested, and whether it is in date: through the last day of the due month in the firm's zone.
 *
 * Marks after the current month do not count, nor do those whose kind of test begins no period here; before the first
 * test the month it was made in counts (49 CFR 178.35(f)).
 *
 * Source: 49 CFR 180.205(c), 180.209.
 */
export function requalification(input: RequalificationInput): Requalification {
  const { spec } = input.steel
  const last = lastBeginning(input)
  const begun = { lastMonth: last?.month ?? null, intervalMonths: null, dueMonth: null, choice: null }
  if (SPECS[spec]?.requalified === false) return { ...begun, state: 'not-required', basis: notRequired(spec) }
  const left = [...uncounted(input, last).map(notCounted), ...notCovered(input)].map(sentence => ` ${sentence}`).join('')
  if (!last) return { ...begun, intervalMonths: shortestMonths(spec, input.rules), state: 'unknown', basis: `No test date is known.${left}` }
  if (last.period === null) return { ...begun, state: 'unknown', basis: periodNotKnown(spec) }
  const { months, choice } = last.period
  const dueMonth = addMonths(last.month, months)
  return {
    lastMonth: last.month,
    intervalMonths: months,
    dueMonth,
    state: stateOf(daysUntilEndOfMonth(dueMonth, input.nowMs, input.timeZone), input.soonDays ?? DEFAULT_SOON_DAYS),
    basis: `${last.beginning === 'made' ? 'Made' : 'Tested'} ${formatMonth(last.month)}; ${periodInWords(spec, last.period)}.${left}`,
    choice,
  }
}

type Last = { month: Month, beginning: Beginning, period: TestPeriod | null }

function lastBeginning(input: RequalificationInput): Last | null {
  const { steel, rules } = input
  const begun = (beginning: Beginning, month: Month): Last[] => {
    const period = testPeriod(beginning, month, steel, rules)
    return period !== null || (beginning !== 'visual' && shortestMonths(steel.spec, rules) === null) ? [{ month, beginning, period }] : []
  }
  const tests = passedMarks(input).flatMap(({ month, beginning }) => beginning === null ? [] : begun(beginning, month))
  if (tests.length > 0) return tests.reduce((latest, test) => isLaterOrShorter(test, latest) ? test : latest)
  const { madeMonth } = steel
  return madeMonth !== null && hasCome(madeMonth, input) ? begun('made', madeMonth)[0] ?? null : null
}

// Of two marks of one month the one with the shorter period counts.
function isLaterOrShorter(a: Last, b: Last): boolean {
  const order = compareMonths(a.month, b.month)
  return order === 0 ? (a.period?.months ?? 0) < (b.period?.months ?? 0) : order > 0
}

function passedMarks(input: RequalificationInput): (RequalificationMark & { beginning: Beginning | null })[] {
  return input.marks
    .filter(({ month, result }) => (result === undefined || result === 'passed') && hasCome(month, input))
    .map(mark => ({ ...mark, beginning: beginningOf(mark) }))
}

function hasCome(month: Month, { nowMs, timeZone }: RequalificationInput): boolean {
  return compareMonths(month, monthOfInstant(nowMs, timeZone)) <= 0
}

/** What a mark begins: the lesser test, where the method and the suffix say different ones; null where neither tells. */
function beginningOf({ method, suffix }: RequalificationMark): Beginning | null {
  const marked = suffixMeaning(suffix ?? '')?.beginning ?? null
  if (marked === null) return method ?? null
  return (['visual', 'proof'] as const).find(lesser => lesser === method || lesser === marked) ?? marked
}

/** The latest mark that came after the one that counts, and begins no period itself. */
function uncounted(input: RequalificationInput, last: Last | null): ReturnType<typeof passedMarks> {
  const later = passedMarks(input)
    .filter(mark => last === null || last.beginning === 'made' || compareMonths(mark.month, last.month) > 0)
    .sort((a, b) => compareMonths(b.month, a.month))
  return later.slice(0, 1)
}

function notCounted({ month, beginning, suffix }: ReturnType<typeof passedMarks>[number]): string {
  const when = formatMonth(month)
  if (beginning === null) return `The mark of ${when} does not count: no test is marked ${suffix} (49 CFR 180.213).`
  const [what, paragraph] = beginning === 'visual' ? ['outside look', '180.209(g)'] : ['proof pressure test', '180.209(e)']
  return `The ${what} of ${when} does not count: only 49 CFR ${paragraph} lets it stand in for a volumetric test, and no choice of the owner’s covers this cylinder.`
}

/** Why a choice that was made for cylinders like this one is not for this one. */
function notCovered({ steel, rules }: RequalificationInput): string[] {
  const { isOwn, hasHeldBurnt } = steel.service
  const isMeant = rules.ownerChoices.some(({ paragraph }) => CHOICE_TERMS[paragraph].specs.includes(steel.spec))
  if (!isMeant) return []
  if (!isOwn) return ['It is not the firm’s own, so the owner’s choice does not cover it.']
  return hasHeldBurnt ? ['Burnt refrigerant was in it, so the owner’s choice does not cover it.'] : []
}

function periodInWords(spec: string, { months, choice, isOwnMonths }: TestPeriod): string {
  if (isOwnMonths) return `due ${months} months later by the owner’s own setting`
  return choice === null
    ? `due ${months} months later by 49 CFR 180.209(a), Table 1, for ${spec}`
    : `due ${months} months later by 49 CFR ${choice.paragraph}, as the owner chose: ${choice.reason.replace(/\.$/, '')}`
}

function notRequired(spec: string): string {
  return spec === 'DOT-39'
    ? 'A DOT-39 is never refilled, so it is never tested again (49 CFR 178.65).'
    : `No test is asked of a ${spec} (49 CFR 180.209(a), Table 1).`
}

function periodNotKnown(spec: string): string {
  return spec === 'DOT-SP'
    ? 'Its special permit names its test period, and the owner has not entered that.'
    : `No test period is known for ${spec}.`
}

function stateOf(daysLeft: number, soonDays: number): Requalification['state'] {
  if (daysLeft < 0) return 'overdue'
  return daysLeft <= soonDays ? 'due-soon' : 'in-date'
}
