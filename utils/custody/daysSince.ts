import { calendarDay, calendarDayNow } from '../quantity/month'

const MS_PER_DAY = 86_400_000

/** Calendar days from one instant to another in a time zone: 0 on the same day. */
export function daysSince(thenMs: number, nowMs: number, timeZone: string): number {
  return Math.round((calendarDayNow(nowMs, timeZone) - calendarDay(thenMs, timeZone)) / MS_PER_DAY)
}
