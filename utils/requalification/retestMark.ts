import type { Month } from '../quantity/month'
import { readMonthMark } from '../quantity/monthMark'
import { capitalsAndStars, tidySuffix } from './retestSuffix'

/** A retest mark as it was read off the steel; null = not typed, or not to be read. */
export type RetestMark = { month: Month, rin: string | null, suffix: string | null }

const MONTH = String.raw`\d{1,2}`
const YEAR = String.raw`\d{4}|\d{2}`
const GAP = String.raw`[\s\-–/.,|]+`
const SUFFIX = `(?:${GAP})?([A-Z]{1,3}|[*+]{1,2})?`
// The RIN in one piece, or the two rows of its square; a letter in the upper row tells rows from a month and a year.
const SQUARE = String.raw`(?:([A-Z0-9]{4})|([A-Z]\d|\d[A-Z]|[A-Z]{2})${GAP}([A-Z0-9]{2}))`

const AS_STRUCK = new RegExp(`^(?<month>${MONTH})${GAP}${SQUARE}${GAP}(?<year>${YEAR})${SUFFIX}$`)
const RUN_TOGETHER = new RegExp(String.raw`^(?<month>${MONTH})([A-Z]\d{3})()()(?<year>\d{2})${SUFFIX}$`)
const MONTH_AND_YEAR = new RegExp(String.raw`^(?<date>(?:${MONTH})${GAP}(?:${YEAR})|\d{4}${GAP}(?:${MONTH}))(?:${GAP}${SQUARE})?${SUFFIX}$`)
const LOOKS_LIKE_A_YEAR = /^(?:19|20)\d{2}$/
const IN_SQUARE = new RegExp(`^${SQUARE}$`)

/**
 * The requalifier identification number that was typed in one piece or as the two rows of its square; null where it is none.
 *
 * @example readRin('A1/32') // 'A123'
 */
export function readRin(text: string): string | null {
  const [, rin, upper, lower] = IN_SQUARE.exec(text.trim().toUpperCase()) ?? []
  return rin ?? (upper && lower ? clockwise(upper, lower) : null)
}

/**
 * What a retest mark says, typed as it is struck (month, RIN, year, suffix) or with month and year together; null where it
 * cannot be read as one.
 *
 * The RIN is read clockwise from the upper left of its square: "A 1" over "3 2" is A123, and so is "A1/32", its two rows.
 * A suffix that is none of a retest mark is kept as typed.
 *
 * Source: 49 CFR 180.213(d).
 *
 * @example readRetestMark('9 A1/32 06', '2026-12') // { month: '2006-09', rin: 'A123', suffix: null }
 */
export function readRetestMark(text: string, thisMonth: Month): RetestMark | null {
  const typed = capitalsAndStars(text)
  const read = AS_STRUCK.exec(typed) ?? RUN_TOGETHER.exec(typed) ?? MONTH_AND_YEAR.exec(typed)
  if (!read?.groups) return null
  const { date, month: struckMonth, year } = read.groups
  const [rin, upper, lower, suffix] = date === undefined ? [read[2], read[3], read[4], read[6]] : read.slice(2)
  const month = readMonthMark(date?.replace(/\D+/, '-') ?? `${struckMonth}-${year}`, thisMonth)
  if (month === null || LOOKS_LIKE_A_YEAR.test(rin ?? '')) return null
  return {
    month,
    rin: rin || (upper && lower ? clockwise(upper, lower) : null),
    suffix: suffix ? tidySuffix(suffix) : null,
  }
}

/** The four characters of a square, from the upper left clockwise. */
function clockwise(upper: string, lower: string): string {
  return `${upper}${lower[1]}${lower[0]}`
}
