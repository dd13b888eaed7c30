import { MS_PER_DAY } from './instant'

/** A calendar month as 'YYYY-MM', the way a test date is stamped. */
export type Month = string

const MONTH_TEXT = /^(\d{4})-(0[1-9]|1[0-2])$/
const MONTH_NAMES = [
  'January', 'February', 'March', 'April', 'May', 'June',
  'July', 'August', 'September', 'October', 'November', 'December',
] as const

/** Whether a text is a month. */
export function isMonth(text: string): text is Month {
  return MONTH_TEXT.test(text)
}

/** The month a number of months later (earlier where negative). Errors: RangeError where the text is no month. */
export function addMonths(month: Month, months: number): Month {
  return monthOfCount(monthCount(month) + months)
}

/** Below zero where the first month is the earlier, above where the later, zero where they are the same. */
export function compareMonths(a: Month, b: Month): number {
  return monthCount(a) - monthCount(b)
}

/** The month it is at an instant in a time zone. */
export function monthOfInstant(ms: number, timeZone: string): Month {
  // No zone is a day off UTC, so mostly it is the same month everywhere; to ask for the zone's calendar takes ten times as long.
  const earliest = utcMonthCount(ms - MS_PER_DAY)
  if (earliest === utcMonthCount(ms + MS_PER_DAY)) return monthOfCount(earliest)
  const { year, month } = dateIn(dateFormat(timeZone), ms)
  return monthOfCount(year * 12 + month - 1)
}

/** Calendar days from today to the last day of a month in a time zone: 0 on that day, negative after it. */
export function daysUntilEndOfMonth(month: Month, nowMs: number, timeZone: string): number {
  const next = monthCount(month) + 1
  const lastDay = Date.UTC(Math.floor(next / 12), next % 12, 0)
  return Math.round((lastDay - calendarDayNow(nowMs, timeZone)) / MS_PER_DAY)
}

/** The calendar day of an instant in a time zone, as the instant at which that day begins in UTC. Units: milliseconds. */
export function calendarDay(ms: number, timeZone: string): number {
  const { year, month, day } = dateIn(dateFormat(timeZone), ms)
  return Date.UTC(year, month - 1, day)
}

/** The same as {@link calendarDay}, for an instant that is asked about again and again, as the present one is for each row of a list. */
export function calendarDayNow(nowMs: number, timeZone: string): number {
  const last = lastDays.get(timeZone)
  if (last?.ms === nowMs) return last.day
  const day = calendarDay(nowMs, timeZone)
  lastDays.set(timeZone, { ms: nowMs, day })
  return day
}

/**
 * A month as people write it.
 *
 * @example formatMonth('2027-03') // 'March 2027'
 */
export function formatMonth(month: Month): string {
  const count = monthCount(month)
  return `${MONTH_NAMES[count % 12]} ${Math.floor(count / 12)}`
}

function monthCount(month: Month): number {
  const parts = MONTH_TEXT.exec(month)
  if (!parts) throw new RangeError(`Not a month: ${month}`)
  return Number(parts[1]) * 12 + Number(parts[2]) - 1
}

function utcMonthCount(ms: number): number {
  const date = new Date(ms)
  return date.getUTCFullYear() * 12 + date.getUTCMonth()
}

function monthOfCount(count: number): Month {
  return `${String(Math.floor(count / 12)).padStart(4, '0')}-${String(count % 12 + 1).padStart(2, '0')}`
}

// A format costs a hundred times its use, and every view asks for one; nothing but the time zone goes into it.
const formats = new Map<string, Intl.DateTimeFormat>()
const lastDays = new Map<string, { ms: number, day: number }>()

function dateFormat(timeZone: string): Intl.DateTimeFormat {
  const format = formats.get(timeZone)
    ?? new Intl.DateTimeFormat('en-US', { timeZone, calendar: 'gregory', year: 'numeric', month: 'numeric', day: 'numeric' })
  formats.set(timeZone, format)
  return format
}

function dateIn(format: Intl.DateTimeFormat, ms: number): { year: number, month: number, day: number } {
  // Month, day and year, as this format has them; their parts one by one would cost three times as much.
  const [month, day, year] = format.format(ms).split('/').map(Number) as [number, number, number]
  return { year, month, day }
}
