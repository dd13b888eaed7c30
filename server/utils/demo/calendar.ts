import type { Random } from './random'

/** Lengths of time. Units: milliseconds. */
export const MINUTE = 60_000
export const HOUR = 60 * MINUTE
export const DAY = 24 * HOUR

/** An instant as people of a time zone write it: ISO 8601 with the offset of that day. */
export function localIso(ms: number, timeZone: string): string {
  const parts = offsetFormat(timeZone).formatToParts(ms)
  const offset = parts.find(part => part.type === 'timeZoneName')?.value.slice('GMT'.length) || '+00:00'
  const minutes = (Number(offset.slice(1, 3)) * 60 + Number(offset.slice(4, 6))) * (offset.startsWith('-') ? -1 : 1)
  return new Date(ms + minutes * MINUTE).toISOString().replace('Z', offset)
}

/** Some minute of a working day, so many days after an instant; a weekend goes on to Monday. */
export function workingTime(from: number, days: number, random: Random): number {
  return startOfWork(from + days * DAY) + random.whole(0, 8 * 60) * MINUTE
}

/** An hour into the working day of an instant: when a dispatch leaves. */
export function workingMorning(at: number): number {
  return startOfWork(at) + HOUR
}

function startOfWork(at: number): number {
  const day = new Date(at)
  const weekday = day.getUTCDay()
  if (weekday === 0 || weekday === 6) day.setUTCDate(day.getUTCDate() + (weekday === 6 ? 2 : 1))
  // 14 to 22 h UTC is the working day of the demo's time zone.
  day.setUTCHours(14, 0, 0, 0)
  return day.getTime()
}

/** 'YYYY-MM', so many months after the month of an instant. */
export function monthFrom(ms: number, months: number): string {
  const date = new Date(ms)
  date.setUTCDate(1)
  date.setUTCMonth(date.getUTCMonth() + months)
  return date.toISOString().slice(0, 7)
}

const formats = new Map<string, Intl.DateTimeFormat>()

/** Costly to make, and asked for at each event. */
function offsetFormat(timeZone: string): Intl.DateTimeFormat {
  const format = formats.get(timeZone) ?? new Intl.DateTimeFormat('en-US', { timeZone, timeZoneName: 'longOffset' })
  formats.set(timeZone, format)
  return format
}
