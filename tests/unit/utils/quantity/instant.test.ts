import { describe, expect, it } from 'vitest'
import { daysBetween, formatInstant, formatNear, formatSpan, isoWithOffset } from '../../../../utils/quantity/instant'

const PHOENIX = 'America/Phoenix'
// Phoenix keeps UTC-7 all year.
const at = (iso: string) => Date.parse(iso)

describe('an instant on the wall clock of a time zone', () => {
  it('is written with day and time, and with its year where that is not the present one', () => {
    const now = at('2026-12-01T20:00:00Z')
    expect(formatInstant(at('2026-12-01T16:41:00Z'), PHOENIX, now)).toBe('1 Dec 09:41')
    expect(formatInstant(at('2025-12-31T16:41:00Z'), PHOENIX, now)).toBe('31 Dec 2025 09:41')
  })

  it('belongs to the day of that zone, not of UTC', () => {
    const now = at('2026-12-02T06:59:00Z')
    expect(formatNear(at('2026-12-01T07:00:00Z'), PHOENIX, now)).toBe('today 00:00')
    expect(formatNear(at('2026-12-01T06:59:00Z'), PHOENIX, now)).toBe('yesterday 23:59')
    expect(formatNear(at('2026-11-30T06:59:00Z'), PHOENIX, now)).toBe('29 Nov 23:59')
  })

  it('counts midnight as hour 00', () => {
    expect(formatInstant(at('2026-12-01T07:00:00Z'), PHOENIX, at('2026-12-01T20:00:00Z'))).toBe('1 Dec 00:00')
  })

  it('counts calendar days across a change of the clock', () => {
    // Chicago went from UTC-6 to UTC-5 on 8 March 2026.
    expect(daysBetween(at('2026-03-08T05:30:00Z'), at('2026-03-09T04:30:00Z'), 'America/Chicago')).toBe(1)
  })
})

describe('a span of time', () => {
  it('shows its two largest measures, rounded down', () => {
    expect(formatSpan(41 * 3_600_000 + 59 * 60_000)).toBe('1 d 17 h')
    expect(formatSpan(24 * 3_600_000)).toBe('1 d')
    expect(formatSpan(3_600_000 + 60_000)).toBe('1 h 1 min')
    expect(formatSpan(59_999)).toBe('0 min')
  })
})

describe('an instant as an event carries it', () => {
  it('keeps the offset of the clock that it was read from', () => {
    expect(isoWithOffset(at('2026-12-01T16:41:05Z'), -420)).toBe('2026-12-01T09:41:05.000-07:00')
    expect(isoWithOffset(at('2026-12-01T16:41:05Z'), 330)).toBe('2026-12-01T22:11:05.000+05:30')
    expect(isoWithOffset(at('2026-12-01T16:41:05Z'), 0)).toBe('2026-12-01T16:41:05.000+00:00')
  })
})
