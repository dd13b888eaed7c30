import { describe, expect, it } from 'vitest'
import { askedDays, daysOf, spanOf } from '~~/utils/records/period'

const CHICAGO = 'America/Chicago'
/** 23:30 on 31 March in Chicago, when it is April in Greenwich. */
const LATE_IN_MARCH = Date.parse('2026-04-01T04:30:00Z')

describe('a named period', () => {
  it('is in the months of the firm\'s clock', () => {
    expect(daysOf('this-month', LATE_IN_MARCH, CHICAGO)).toEqual({ from: '2026-03-01', to: '2026-03-31' })
    expect(daysOf('this-month', LATE_IN_MARCH, 'UTC')).toEqual({ from: '2026-04-01', to: '2026-04-01' })
  })

  it('goes over the turn of the year and over a leap day', () => {
    expect(daysOf('last-month', Date.parse('2026-01-15T12:00:00Z'), CHICAGO)).toEqual({ from: '2025-12-01', to: '2025-12-31' })
    expect(daysOf('last-month', Date.parse('2028-03-15T12:00:00Z'), CHICAGO)).toEqual({ from: '2028-02-01', to: '2028-02-29' })
  })

  it('of a year begins in January and ends today', () => {
    expect(daysOf('this-year', LATE_IN_MARCH, CHICAGO)).toEqual({ from: '2026-01-01', to: '2026-03-31' })
  })
})

describe('days asked for', () => {
  const now = Date.parse('2026-06-15T17:00:00Z')

  it.each([
    [{}, { from: '2026-06-01', to: '2026-06-15' }],
    [{ from: '2026-02-10' }, { from: '2026-02-10', to: '2026-02-28' }],
    [{ from: '2026-06-10' }, { from: '2026-06-10', to: '2026-06-15' }],
    [{ from: '2026-07-10' }, { from: '2026-07-10', to: '2026-07-31' }],
    [{ to: '2026-02-10' }, { from: '2026-02-01', to: '2026-02-10' }],
    [{ from: '2026-01-05', to: '2026-03-04' }, { from: '2026-01-05', to: '2026-03-04' }],
  ])('%j are the days %j', (asked, days) => {
    expect(askedDays(asked, now, CHICAGO)).toEqual(days)
  })
})

describe('the instants of a period', () => {
  it('are midnights of the firm\'s clock: a March in Chicago is an hour short, a November an hour long', () => {
    // Daylight saving begins on 8 March and ends on 1 November 2026: UTC-6 in winter, UTC-5 in summer.
    expect(spanOf({ from: '2026-03-01', to: '2026-03-31' }, CHICAGO)).toEqual({ fromMs: Date.parse('2026-03-01T06:00:00Z'), untilMs: Date.parse('2026-04-01T05:00:00Z') })
    expect(spanOf({ from: '2026-11-01', to: '2026-11-30' }, CHICAGO)).toEqual({ fromMs: Date.parse('2026-11-01T05:00:00Z'), untilMs: Date.parse('2026-12-01T06:00:00Z') })
  })

  it('of one day are that day', () => {
    expect(spanOf({ from: '2026-03-08', to: '2026-03-08' }, CHICAGO)).toEqual({ fromMs: Date.parse('2026-03-08T06:00:00Z'), untilMs: Date.parse('2026-03-09T05:00:00Z') })
  })
})
