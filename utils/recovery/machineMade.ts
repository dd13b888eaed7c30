import { isDay } from '../quantity/day'
import type { MachineMade } from './types'

const LINE = '1993-11-15'
const DATE = /^(19|20)\d{2}(-(0[1-9]|1[0-2])(-\d{2})?)?$/

/** Whether a text is a date of a machine: a year, a month or a day that the calendar has. */
export function isMachineDate(text: string): boolean {
  return DATE.test(text) && (text.length < LINE.length || isDay(text))
}

/**
 * Which side of 15 November 1993 a date lies on, as far as it tells: a year or a month that holds that day tells nothing.
 *
 * Source: 40 CFR 82.156 Table 1, "manufactured or imported before" and "on or after".
 *
 * @example machineMadeBy('1993-11') // null
 */
export function machineMadeBy(date: string): MachineMade | null {
  const upTo = LINE.slice(0, date.length)
  if (date.length < LINE.length && date === upTo) return null
  return date < upTo ? 'before-1993-11-15' : 'since-1993-11-15'
}
