const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const
const MS_PER_MINUTE = 60_000
/** A day of the clock; a day of the calendar may be an hour shorter or longer. */
export const MS_PER_DAY = 86_400_000

/** A day and a time of day as a clock on the wall of a time zone shows them. */
export interface WallClock { year: number, month: number, day: number, hour: number, minute: number }

/** What the clock of a time zone shows at an instant. Units: UTC milliseconds. */
export function wallClock(ms: number, timeZone: string): WallClock {
  const parts = new Intl.DateTimeFormat('en-US', {
    timeZone, calendar: 'gregory', hourCycle: 'h23',
    year: 'numeric', month: 'numeric', day: 'numeric', hour: 'numeric', minute: 'numeric',
  }).formatToParts(ms)
  const part = (type: string) => Number(parts.find(each => each.type === type)?.value)
  return { year: part('year'), month: part('month'), day: part('day'), hour: part('hour'), minute: part('minute') }
}

/** A day without its year. @example formatDay(ms, 'America/Phoenix') // '1 Dec' */
export function formatDay(ms: number, timeZone: string): string {
  const { month, day } = wallClock(ms, timeZone)
  return `${day} ${MONTHS[month - 1]}`
}

/** A time of day. @example formatTime(ms, 'America/Phoenix') // '09:41' */
export function formatTime(ms: number, timeZone: string): string {
  const { hour, minute } = wallClock(ms, timeZone)
  return `${two(hour)}:${two(minute)}`
}

/** A day and a time; with the year where it is not the reader's present one. @example '1 Dec 09:41', '1 Dec 2025 09:41' */
export function formatInstant(ms: number, timeZone: string, nowMs: number): string {
  const { year } = wallClock(ms, timeZone)
  const withYear = year === wallClock(nowMs, timeZone).year ? '' : ` ${year}`
  return `${formatDay(ms, timeZone)}${withYear} ${formatTime(ms, timeZone)}`
}

/** An instant as people near it say it. @example 'today 09:41', 'yesterday 17:02', '1 Dec 09:41' */
export function formatNear(ms: number, timeZone: string, nowMs: number): string {
  const days = daysBetween(ms, nowMs, timeZone)
  if (days === 0) return `today ${formatTime(ms, timeZone)}`
  if (days === 1) return `yesterday ${formatTime(ms, timeZone)}`
  return formatInstant(ms, timeZone, nowMs)
}

/** Calendar days in a time zone from one instant to another; negative where the second is the earlier day. */
export function daysBetween(fromMs: number, toMs: number, timeZone: string): number {
  const day = (ms: number) => {
    const clock = wallClock(ms, timeZone)
    return Date.UTC(clock.year, clock.month - 1, clock.day)
  }
  return Math.round((day(toMs) - day(fromMs)) / MS_PER_DAY)
}

/**
 * How long something took or came late, in its two largest measures.
 *
 * Rounding: down to the whole minute. @example formatSpan(147_660_000) // '1 d 17 h'
 */
export function formatSpan(ms: number): string {
  const minutes = Math.floor(Math.abs(ms) / MS_PER_MINUTE)
  const [days, hours, rest] = [Math.floor(minutes / 1440), Math.floor(minutes / 60) % 24, minutes % 60]
  if (days > 0) return hours > 0 ? `${days} d ${hours} h` : `${days} d`
  if (hours > 0) return rest > 0 ? `${hours} h ${rest} min` : `${hours} h`
  return `${rest} min`
}

/**
 * An instant in ISO 8601 with the offset of the clock it was read from.
 *
 * Units: UTC milliseconds; minutes east of UTC. @example isoWithOffset(0, -420) // '1969-12-31T17:00:00.000-07:00'
 */
export function isoWithOffset(ms: number, offsetMinutes: number): string {
  const local = new Date(ms + offsetMinutes * MS_PER_MINUTE).toISOString().slice(0, -1)
  const sign = offsetMinutes < 0 ? '-' : '+'
  const minutes = Math.abs(offsetMinutes)
  return `${local}${sign}${two(Math.floor(minutes / 60))}:${two(minutes % 60)}`
}

function two(value: number): string {
  return String(value).padStart(2, '0')
}
