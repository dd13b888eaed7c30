import { describe, expect, it } from 'vitest'
import { dayAfter, dayBefore, dayOfInstant, firstInstantOfDay, formatWholeDay, isDay } from '~~/utils/quantity/day'

describe('a day of the calendar', () => {
  it('is one that the month has, in leap years one more', () => {
    expect(['1993-02-28', '1996-02-29', '2026-12-31'].map(isDay)).toEqual([true, true, true])
    expect(['1993-02-29', '1993-02-31', '2026-04-31', '2026-12-32', '2026-13-01', '2026-12', ''].map(isDay)).toEqual([false, false, false, false, false, false, false])
  })
})

describe('the day before and after', () => {
  it('goes over the ends of months and years, and over a leap day', () => {
    expect([dayAfter('2026-12-31'), dayAfter('2028-02-28'), dayAfter('2026-02-28')]).toEqual(['2027-01-01', '2028-02-29', '2026-03-01'])
    expect([dayBefore('2027-01-01'), dayBefore('2028-03-01'), dayBefore('2026-03-01')]).toEqual(['2026-12-31', '2028-02-29', '2026-02-28'])
  })
})

describe('a day in the firm\'s time zone', () => {
  it('begins at its midnight there', () => {
    // Chicago is at UTC-6 in winter.
    expect(firstInstantOfDay('2026-12-15', 'America/Chicago')).toBe(Date.UTC(2026, 11, 15, 6))
    expect(firstInstantOfDay('2026-12-15', 'Asia/Tokyo')).toBe(Date.UTC(2026, 11, 14, 15))
  })

  it('begins where the clock jumps over midnight with its first minute', () => {
    // In Havana the clock goes from 0:00 to 1:00 on 8 March 2026: the day begins at 5:00 UTC.
    expect(firstInstantOfDay('2026-03-08', 'America/Havana')).toBe(Date.UTC(2026, 2, 8, 5))
  })

  it('is the day before until then', () => {
    const midnight = Date.UTC(2026, 11, 15, 6)
    expect(dayOfInstant(midnight - 1, 'America/Chicago')).toBe('2026-12-14')
    expect(dayOfInstant(midnight, 'America/Chicago')).toBe('2026-12-15')
  })
})

it('is written with its year', () => {
  expect(formatWholeDay('2026-10-14')).toBe('14 Oct 2026')
  expect(formatWholeDay('2025-01-01')).toBe('1 Jan 2025')
})
