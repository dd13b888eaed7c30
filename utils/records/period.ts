import type { Period } from '../contract/massBalance'
import { dayAfter, dayBefore, dayOfInstant, firstInstantOfDay, type Day } from '../quantity/day'
import { addMonths, monthOfInstant } from '../quantity/month'
import type { Span } from './books'

/** The first and the last of the days of a period. */
export interface Days { from: Day, to: Day }

/** Periods that have a name. */
export const NAMED_PERIODS = ['this-month', 'last-month', 'this-year'] as const
export type NamedPeriod = (typeof NAMED_PERIODS)[number]

/** The days of a named period; one that is not over ends today. */
export function daysOf(period: NamedPeriod, nowMs: number, timeZone: string): Days {
  const today = dayOfInstant(nowMs, timeZone)
  const month = monthOfInstant(nowMs, timeZone)
  switch (period) {
    case 'this-month': return { from: `${month}-01`, to: today }
    case 'last-month': return { from: `${addMonths(month, -1)}-01`, to: dayBefore(`${month}-01`) }
    case 'this-year': return { from: `${month.slice(0, 4)}-01-01`, to: today }
  }
}

/**
 * The days asked for, with what was left out: from the first of the month of the last day, to the last day of the month
 * of the first, but no further than today.
 */
export function askedDays({ from, to }: { from?: Day, to?: Day }, nowMs: number, timeZone: string): Days {
  const today = dayOfInstant(nowMs, timeZone)
  if (from !== undefined && to === undefined) {
    const monthEnd = dayBefore(`${addMonths(from.slice(0, 7), 1)}-01`)
    return { from, to: monthEnd > today && from <= today ? today : monthEnd }
  }
  const last = to ?? today
  return { from: from ?? `${last.slice(0, 7)}-01`, to: last }
}

/** The instants at which days begin and end in a time zone. */
export function spanOf({ from, to }: Days, timeZone: string): Span {
  return { fromMs: firstInstantOfDay(from, timeZone), untilMs: firstInstantOfDay(dayAfter(to), timeZone) }
}

/** A period as it is answered. */
export function periodOf(days: Days, { fromMs, untilMs }: Span): Period {
  return { ...days, fromAt: new Date(fromMs).toISOString(), untilAt: new Date(untilMs).toISOString() }
}
