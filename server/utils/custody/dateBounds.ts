import { dayOfInstant, firstInstantOfDay } from '../../../utils/quantity/day'
import { MS_PER_DAY } from '../../../utils/quantity/instant'
import { addMonths, daysUntilEndOfMonth, monthOfInstant, type Month } from '../../../utils/quantity/month'
import { retestAt } from '../directory/datedRules'
import type { Directory } from '../directory/directory'

/** Today as bounds for cached columns: the one rule about dates that SQL is allowed. */
export interface DateBounds {
  /** A due month before it is overdue. */
  thisMonth: Month
  /** A due month up to it falls due soon. */
  lastSoonMonth: Month
  /** A cylinder last seen before it (UTC milliseconds) has not been seen for the firm's number of days. */
  notSeenBefore: number
  /** One last seen before it may be missing. */
  missingBefore: number
}

/** The bounds of a day, in the firm's time zone and by the firm's reminders. */
export function dateBounds(from: Pick<Directory, 'timeZone' | 'retests'>, nowMs: number): DateBounds {
  const retest = retestAt(from.retests, nowMs)
  const thisMonth = monthOfInstant(nowMs, from.timeZone)
  let lastSoonMonth = addMonths(thisMonth, -1)
  while (daysUntilEndOfMonth(addMonths(lastSoonMonth, 1), nowMs, from.timeZone) <= retest.soonDays) lastSoonMonth = addMonths(lastSoonMonth, 1)
  return {
    thisMonth,
    lastSoonMonth,
    notSeenBefore: startOfDayAgo(retest.notSeenDays - 1, nowMs, from.timeZone),
    missingBefore: startOfDayAgo(retest.missingDays - 1, nowMs, from.timeZone),
  }
}

/** The first instants of days that were asked for: every page of the fleet asks for the same. */
const firstInstants = new Map<string, number>()
const MOST_KEPT = 100

/** The first instant of the calendar day so many days ago; no day need be 24 hours long. */
function startOfDayAgo(days: number, nowMs: number, timeZone: string): number {
  const day = new Date(Date.parse(dayOfInstant(nowMs, timeZone)) - days * MS_PER_DAY).toISOString().slice(0, 10)
  const key = `${day} ${timeZone}`
  const first = firstInstants.get(key) ?? firstInstantOfDay(day, timeZone)
  if (firstInstants.size >= MOST_KEPT) firstInstants.clear()
  firstInstants.set(key, first)
  return first
}
