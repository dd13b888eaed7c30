import { describe, expect, it } from 'vitest'
import {
  addMonths, compareMonths, daysUntilEndOfMonth, formatMonth, isMonth, monthOfInstant,
} from '~~/utils/quantity/month'

describe('a stamped month', () => {
  it('is a year and a month of it', () => {
    expect(isMonth('2027-03')).toBe(true)
    expect(isMonth('2027-13')).toBe(false)
    expect(isMonth('2027-3')).toBe(false)
    expect(isMonth('2027-03-01')).toBe(false)
  })

  it('moves over the turn of the year', () => {
    expect(addMonths('2022-03', 60)).toBe('2027-03')
    expect(addMonths('2026-11', 2)).toBe('2027-01')
    expect(addMonths('2027-01', -1)).toBe('2026-12')
  })

  it('stands before and after others', () => {
    expect(compareMonths('2026-12', '2027-01')).toBeLessThan(0)
    expect(compareMonths('2027-02', '2027-01')).toBeGreaterThan(0)
    expect(compareMonths('2027-01', '2027-01')).toBe(0)
  })

  it('reads as people write it', () => {
    expect(formatMonth('2027-03')).toBe('March 2027')
    expect(formatMonth('2026-12')).toBe('December 2026')
  })

  it('is refused where it is none', () => {
    expect(() => addMonths('March', 1)).toThrow(RangeError)
  })
})

describe('the end of a month in the firm\'s time zone', () => {
  // Chicago: UTC-6 in winter, UTC-5 from the second Sunday of March.
  const end = Date.UTC(2027, 3, 1, 5) - 1

  it('parts the months of the instants on both sides of it', () => {
    expect(monthOfInstant(end, 'America/Chicago')).toBe('2027-03')
    expect(monthOfInstant(end + 1, 'America/Chicago')).toBe('2027-04')
    expect(monthOfInstant(end, 'UTC')).toBe('2027-04')
  })

  it('is zero days away on its last day and one day past on the next', () => {
    expect(daysUntilEndOfMonth('2027-03', end, 'America/Chicago')).toBe(0)
    expect(daysUntilEndOfMonth('2027-03', end + 1, 'America/Chicago')).toBe(-1)
    expect(daysUntilEndOfMonth('2027-03', Date.UTC(2027, 2, 1, 18), 'America/Chicago')).toBe(30)
  })

  it('is found in a leap year and in December', () => {
    expect(daysUntilEndOfMonth('2028-02', Date.UTC(2028, 1, 1, 12), 'UTC')).toBe(28)
    expect(daysUntilEndOfMonth('2026-12', Date.UTC(2027, 0, 1) - 1, 'UTC')).toBe(0)
    expect(daysUntilEndOfMonth('2026-12', Date.UTC(2027, 0, 1), 'UTC')).toBe(-1)
  })
})
