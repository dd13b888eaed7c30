import { describe, expect, it } from 'vitest'
import { dateFindings, isOverdue, type Dated } from '~~/utils/custody/dateFindings'

const RETEST = { soonDays: 120, notSeenDays: 30, missingDays: 90 }

function found(dated: Partial<Dated>, nowMs: number, timeZone = 'America/Chicago') {
  return dateFindings({ lifecycle: 'in-service', nothingInIt: true, dueMonth: '2027-03', lastSeenAt: nowMs, ...dated }, { nowMs, timeZone, retest: RETEST })
}

describe('the findings of the retest on a day', () => {
  // Chicago is at UTC-5 by the end of March 2027.
  const firstOfApril = Date.UTC(2027, 3, 1, 5)

  it('stop an empty cylinder from the first moment after the due month, and send it to its test', () => {
    expect(found({}, firstOfApril - 1)).toMatchObject([{ code: 'retest-soon', severity: 'caution' }])
    expect(found({}, firstOfApril)).toMatchObject([{
      code: 'retest-overdue', severity: 'stop', text: 'The retest was due in March 2027. Put nothing in; send it for its test.', source: '49 CFR 180.205(c)',
    }])
  })

  it('caution with contents from then on: ship it or empty it, and only then test it', () => {
    expect(found({ nothingInIt: false }, firstOfApril)).toMatchObject([{
      code: 'retest-overdue', severity: 'caution',
      text: 'The retest was due in March 2027. Put nothing more in; ship it or empty it, then send it for its test.',
    }])
  })

  it('go on while it is set apart, away or missing, and end with its life', () => {
    for (const lifecycle of ['quarantined', 'rejected', 'at-reclaim', 'at-test', 'missing'] as const) {
      expect(found({ lifecycle }, firstOfApril)).toMatchObject([{ code: 'retest-overdue' }])
    }
    for (const lifecycle of ['condemned', 'retired'] as const) expect(found({ lifecycle }, firstOfApril)).toEqual([])
  })

  it('are none where no test is asked or no date is known', () => {
    expect(found({ dueMonth: null }, firstOfApril)).toEqual([])
  })

  it('say that it is soon from 120 days ahead', () => {
    // 1 December 2026 to 31 March 2027: 120 days. Chicago is at UTC-6 in December.
    const firstOfDecember = Date.UTC(2026, 11, 1, 6)
    expect(found({}, firstOfDecember)).toMatchObject([{ code: 'retest-soon' }])
    expect(found({}, firstOfDecember - 1)).toEqual([])
  })

  // The first millisecond of November 2026 by the offset of that night: New York changes its clock on 1 November at 2:00.
  it.each([['Pacific/Kiritimati', 14], ['Australia/Lord_Howe', 11], ['Europe/Berlin', 1], ['America/New_York', -4], ['Pacific/Pago_Pago', -11]])(
    'turn at midnight in %s, %d h from UTC', (timeZone, hours) => {
      const firstOfNovember = Date.UTC(2026, 10, 1) - hours * 3_600_000
      expect(isOverdue('2026-10', { nowMs: firstOfNovember - 1, timeZone })).toBe(false)
      expect(isOverdue('2026-10', { nowMs: firstOfNovember, timeZone })).toBe(true)
    })
})
