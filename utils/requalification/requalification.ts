import type { Month } from '../quantity/month'
import { addMonths, compareMonths, daysUntilEndOfMonth, formatMonth, monthOfInstant } from '../quantity/month'
import { intervalMonths } from './intervalMonths'
import { SPECS } from './specs'

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
}

/** What the due month rests on. */
export type RequalificationInput = {
  spec: string
  marks: readonly RequalificationMark[]
  madeMonth: Month | null
  nowMs: number
  timeZone: string
  /** The owner's period, kept with its reason, where it is not the regulation's shortest. */
  intervalMonthsSetting?: number | null
  /** Whether the owner's setting lets an outside look take the place of a test (49 CFR 180.209(g)). */
  visualCounts?: boolean
  /** Days ahead from which the test is due soon. */
  soonDays?: number
}

const DEFAULT_SOON_DAYS = 120

// 49 CFR 180.209(g): the look is repeated every 5 years; 180.209(e): a proof pressure test holds 10 years at most.
const LONGEST_MONTHS_AFTER: Readonly<Record<TestMethod, number>> = { volumetric: Infinity, proof: 120, visual: 60 }

// 49 CFR 180.213: suffix E marks an outside look, S a proof pressure test.
const METHOD_OF_SUFFIX: Readonly<Record<string, TestMethod>> = { E: 'visual', S: 'proof' }

/**
 * When a cylinder must next be tested, and whether it is in date: through the last day of the due month in the firm's zone.
 *
 * Marks after the current month do not count; before the first test the month it was made in does (49 CFR 178.35(f)).
 * Source: 49 CFR 180.205(c), 180.209.
 */
export function requalification(input: RequalificationInput): Requalification {
  const last = lastTest(input)
  const lastMonth = last?.month ?? null
  if (SPECS[input.spec]?.requalified === false) {
    return {
      lastMonth, intervalMonths: null, dueMonth: null, state: 'not-required',
      basis: `A ${input.spec} is not requalified (49 CFR 180.209 Table 1).`,
    }
  }
  const months = periodAfter(last?.method, intervalMonths(input.spec, input.intervalMonthsSetting))
  if (months === null) {
    return { lastMonth, intervalMonths: null, dueMonth: null, state: 'unknown', basis: `No test period is known for ${input.spec}.` }
  }
  if (!last) return { lastMonth, intervalMonths: months, dueMonth: null, state: 'unknown', basis: 'No test date is known.' }
  const dueMonth = addMonths(last.month, months)
  return {
    lastMonth,
    intervalMonths: months,
    dueMonth,
    state: stateOf(daysUntilEndOfMonth(dueMonth, input.nowMs, input.timeZone), input.soonDays ?? DEFAULT_SOON_DAYS),
    basis: `${last.stamped ? 'Tested' : 'Made'} ${formatMonth(last.month)}, ${months} months for ${input.spec} (49 CFR 180.209).`,
  }
}

type LastTest = { month: Month, method: TestMethod | undefined, stamped: boolean }

function lastTest(input: RequalificationInput): LastTest | null {
  const currentMonth = monthOfInstant(input.nowMs, input.timeZone)
  const known = (month: Month) => compareMonths(month, currentMonth) <= 0
  let latest: LastTest | null = null
  for (const mark of input.marks) {
    const method = mark.method ?? METHOD_OF_SUFFIX[mark.suffix?.toUpperCase() ?? '']
    const passed = mark.result === undefined || mark.result === 'passed'
    const counts = passed && known(mark.month) && (method !== 'visual' || input.visualCounts === true)
    if (counts && (latest === null || compareMonths(mark.month, latest.month) > 0)) {
      latest = { month: mark.month, method, stamped: true }
    }
  }
  if (latest !== null) return latest
  return input.madeMonth !== null && known(input.madeMonth) ? { month: input.madeMonth, method: undefined, stamped: false } : null
}

function periodAfter(method: TestMethod | undefined, months: number | null): number | null {
  return months === null || method === undefined ? months : Math.min(months, LONGEST_MONTHS_AFTER[method])
}

function stateOf(daysLeft: number, soonDays: number): Requalification['state'] {
  if (daysLeft < 0) return 'overdue'
  return daysLeft <= soonDays ? 'due-soon' : 'in-date'
}
