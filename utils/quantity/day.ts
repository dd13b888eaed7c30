import { formatDay, MS_PER_DAY, wallClock } from './instant'

/** A calendar day as 'YYYY-MM-DD'. */
export type Day = string

/** Whether a text is a day that the calendar has. */
export function isDay(text: string): boolean {
  const midnight = new Date(`${text}T00:00:00Z`)
  // The 31st of February is read as a day of March.
  return !Number.isNaN(midnight.getTime()) && midnight.toISOString().startsWith(`${text}T`)
}

/** The next day of the calendar. */
export function dayAfter(day: Day): Day {
  return shifted(day, 1)
}

/** The day of the calendar before. */
export function dayBefore(day: Day): Day {
  return shifted(day, -1)
}

/** The day it is at an instant (UTC milliseconds) in a time zone. */
export function dayOfInstant(ms: number, timeZone: string): Day {
  const { year, month, day } = wallClock(ms, timeZone)
  return `${String(year).padStart(4, '0')}-${two(month)}-${two(day)}`
}

/** A day with its year. @example formatWholeDay('2026-10-14') // '14 Oct 2026' */
export function formatWholeDay(day: Day): string {
  // A day has no zone: its midnight is written and read in the same one.
  return `${formatDay(Date.parse(`${day}T00:00:00Z`), 'UTC')} ${Number(day.slice(0, 4))}`
}

/**
 * The first millisecond of a day in a time zone.
 *
 * Found by halving, so that a change of the clock at midnight cannot move it.
 */
export function firstInstantOfDay(day: Day, timeZone: string): number {
  const midnightInUtc = Date.parse(`${day}T00:00:00Z`)
  let before = midnightInUtc - MS_PER_DAY
  let within = midnightInUtc + MS_PER_DAY
  while (within - before > 1) {
    const middle = Math.floor((before + within) / 2)
    if (dayOfInstant(middle, timeZone) < day) before = middle
    else within = middle
  }
  return within
}

function shifted(day: Day, days: number): Day {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * MS_PER_DAY).toISOString().slice(0, 10)
}

function two(value: number): string {
  return String(value).padStart(2, '0')
}
