import { MS_PER_DAY } from '../quantity/instant'
import { calendarDay, calendarDayNow } from '../quantity/month'

/** Calendar days from one instant to another in a time zone: 0 on the same day. */
export function daysSince(thenMs: number, nowMs: number, timeZone: string): number {
  return Math.round((calendarDayNow(nowMs, timeZone) - calendarDay(thenMs, timeZone)) / MS_PER_DAY)
}
