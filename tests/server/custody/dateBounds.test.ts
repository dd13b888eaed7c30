import { describe, expect, it } from 'vitest'
import { dateBounds } from '../../../server/utils/custody/dateBounds'
import { dateFindings } from '../../../utils/custody/dateFindings'

const retest = { intervalMonths: null, soonDays: 120, notSeenDays: 30, missingDays: 90, ownerChoices: [] }
const retests = [{ id: 'first', fromAt: 0, retest }]

const seenAt = (lastSeenAt: number, nowMs: number, timeZone: string) =>
  dateFindings({ lifecycle: 'in-service', nothingInIt: true, dueMonth: null, lastSeenAt }, { nowMs, timeZone, retest }).map(({ text }) => text)

describe('the bound before which a cylinder was last seen too long ago', () => {
  it.each([
    // Clocks went back on 1 November 2026 at 2 in the morning, and forward on 8 March 2026.
    ['an hour was gained since', 'America/New_York', '2026-11-20T17:00:00Z', '2026-10-22T04:00:00Z'],
    ['an hour was lost since', 'America/New_York', '2026-03-20T16:00:00Z', '2026-02-19T05:00:00Z'],
    ['it is the day on which one is gained', 'America/New_York', '2026-11-01T17:00:00Z', '2026-10-03T04:00:00Z'],
    ['no clock is ever changed', 'America/Phoenix', '2026-11-20T17:00:00Z', '2026-10-22T07:00:00Z'],
  ])('is the first instant of the 29th day before, where %s', (_, timeZone, now, bound) => {
    const nowMs = Date.parse(now)
    const { notSeenBefore } = dateBounds({ timeZone, retests }, nowMs)
    expect(new Date(notSeenBefore).toISOString()).toBe(new Date(bound).toISOString())
    // The page of one cylinder counts days; both sides of the bound must read the same there.
    expect(seenAt(notSeenBefore, nowMs, timeZone)).toEqual([])
    expect(seenAt(notSeenBefore - 1, nowMs, timeZone)).toEqual([expect.stringContaining('30 days')])
  })

  it('has another for those that may be missing', () => {
    const nowMs = Date.parse('2026-11-20T17:00:00Z')
    const { missingBefore } = dateBounds({ timeZone: 'America/New_York', retests }, nowMs)
    expect(new Date(missingBefore).toISOString()).toBe('2026-08-23T04:00:00.000Z')
    expect(seenAt(missingBefore, nowMs, 'America/New_York')).toEqual([expect.stringContaining('Nothing was recorded for 89 days')])
    expect(seenAt(missingBefore - 1, nowMs, 'America/New_York')).toEqual([expect.stringContaining('Missing? Nothing was recorded for 90 days')])
  })
})
