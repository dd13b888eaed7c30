import { addMonths, formatMonth, type Month } from '../quantity/month'

/** One month of the strip of falling-due retests. */
export type MonthCell = {
  month: Month
  /** "Dec". */
  short: string
  /** "December 2026". */
  long: string
  count: number
  /** Within the time before a due date in which the firm wants to hear of it. */
  soon: boolean
}

const MONTHS_SHOWN = 12

/** Lays out the twelve months from this one on; `soonMonths` of them, this one counted, are within the warning time. */
export function layOutMonths(from: Month, counts: Readonly<Record<Month, number>>, soonMonths: number): MonthCell[] {
  return Array.from({ length: MONTHS_SHOWN }, (_, index) => {
    const month = addMonths(from, index)
    const long = formatMonth(month)
    return { month, long, short: long.slice(0, 3), count: counts[month] ?? 0, soon: index < soonMonths }
  })
}
