import { isMonth, type Month } from './month'

const MONTH_FIRST = /^(\d{1,2})\s*[-–/. ]\s*(\d{2}|\d{4})$/
const YEAR_FIRST = /^(\d{4})\s*[-–/. ]\s*(\d{1,2})$/
// A two-digit year up to this many years ahead is read as a slip into the future, not as a century ago.
const YEARS_AHEAD = 5

/**
 * The month that a stamped or typed mark names, or null where it names none.
 *
 * Shape: month and year as they are struck, '03-21' or '3 2021', or year first, '2021-03'. A year of two digits is
 * the latest that lies at most five years after `thisMonth`, so that 98 is 1998 and a slip into the future can be asked about.
 *
 * @example readMonthMark('03-21', '2026-12') // '2021-03'
 */
export function readMonthMark(text: string, thisMonth: Month): Month | null {
  const typed = text.trim()
  const yearFirst = YEAR_FIRST.exec(typed)
  if (yearFirst) return monthOf(Number(yearFirst[1]), yearFirst[2]!)
  const monthFirst = MONTH_FIRST.exec(typed)
  if (!monthFirst) return null
  const year = Number(monthFirst[2])
  return monthOf(monthFirst[2]!.length === 4 ? year : fullYear(year, Number(thisMonth.slice(0, 4))), monthFirst[1]!)
}

function fullYear(year: number, thisYear: number): number {
  const century = Math.floor(thisYear / 100) * 100
  const inThisCentury = century + year
  return inThisCentury > thisYear + YEARS_AHEAD ? inThisCentury - 100 : inThisCentury
}

function monthOf(year: number, month: string): Month | null {
  const text = `${String(year).padStart(4, '0')}-${month.padStart(2, '0')}`
  return isMonth(text) ? text : null
}
