import { addMonths, daysUntilEndOfMonth, monthOfInstant, type Month } from '../../../utils/quantity/month'
import { retestAt } from '../directory/datedRules'
import type { Directory } from '../directory/directory'

const MS_PER_DAY = 86_400_000

/** Today as bounds for cached columns: the one rule about dates that SQL is allowed. */
export interface DateBounds {
  /** A due month before it is overdue. */
  thisMonth: Month
  /** A due month up to it falls due soon. */
  lastSoonMonth: Month
  /** A cylinder last seen before it (UTC milliseconds) has not been seen for the firm's number of days. */
  notSeenBefore: number
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
    notSeenBefore: startOfDay(nowMs, from.timeZone) - (retest.notSeenDays - 1) * MS_PER_DAY,
  }
}

/** The first instant of the calendar day in a time zone. */
function startOfDay(ms: number, timeZone: string): number {
  const parts = new Intl.DateTimeFormat('en-US', { timeZone, hour: 'numeric', minute: 'numeric', second: 'numeric', hourCycle: 'h23' }).formatToParts(ms)
  const part = (type: string) => Number(parts.find(one => one.type === type)?.value ?? 0)
  return ms - ((part('hour') * 60 + part('minute')) * 60 + part('second')) * 1000 - (ms % 1000)
}
