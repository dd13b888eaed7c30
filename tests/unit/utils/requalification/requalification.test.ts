import { describe, expect, it } from 'vitest'
import type { RequalificationInput } from '~~/utils/requalification/requalification'
import { requalification } from '~~/utils/requalification/requalification'

const CHICAGO = 'America/Chicago'
// The last millisecond of March 2027 in Chicago, which keeps summer time by then.
const END_OF_MARCH = Date.UTC(2027, 3, 1, 5) - 1

function stand(changes: Partial<RequalificationInput> = {}) {
  return requalification({
    spec: 'DOT-4BA', marks: [{ month: '2022-03' }], madeMonth: '2012-06', nowMs: Date.UTC(2026, 5, 1), timeZone: CHICAGO, ...changes,
  })
}

describe('the due month', () => {
  it('is five years after the last test', () => {
    expect(stand()).toEqual({
      lastMonth: '2022-03', intervalMonths: 60, dueMonth: '2027-03', state: 'in-date',
      basis: 'Tested March 2022, 60 months for DOT-4BA (49 CFR 180.209).',
    })
  })

  it('counts from the latest mark, in whatever order they are read', () => {
    expect(stand({ marks: [{ month: '2024-05' }, { month: '2019-04' }] }).dueMonth).toBe('2029-05')
    expect(stand({ marks: [{ month: '2019-04' }, { month: '2024-05' }] }).dueMonth).toBe('2029-05')
  })

  it('counts from the month it was made before the first test', () => {
    expect(stand({ marks: [], madeMonth: '2023-01' })).toMatchObject({ lastMonth: '2023-01', dueMonth: '2028-01', state: 'in-date' })
    expect(stand({ marks: [], madeMonth: '2023-01' }).basis).toContain('Made January 2023')
  })

  it('is not moved by a mark that lies ahead, nor by a month of making that does', () => {
    expect(stand({ marks: [{ month: '2022-03' }, { month: '2026-06' }], nowMs: Date.UTC(2026, 5, 15) }).dueMonth).toBe('2031-06')
    expect(stand({ marks: [{ month: '2022-03' }, { month: '2026-07' }], nowMs: Date.UTC(2026, 5, 15) }).dueMonth).toBe('2027-03')
    expect(stand({ marks: [], madeMonth: '2026-07', nowMs: Date.UTC(2026, 5, 15) }).state).toBe('unknown')
  })

  it('takes the current month by the firm\'s zone', () => {
    // 1 July 02:00 in UTC is still June in Chicago.
    const early = { marks: [{ month: '2022-03' }, { month: '2026-07' }], nowMs: Date.UTC(2026, 6, 1, 2) }
    expect(stand(early).dueMonth).toBe('2027-03')
    expect(stand({ ...early, timeZone: 'UTC' }).dueMonth).toBe('2031-07')
  })

  it('is not moved by a test that was not passed', () => {
    expect(stand({ marks: [{ month: '2022-03' }, { month: '2025-01', result: 'rejected' }] }).lastMonth).toBe('2022-03')
    expect(stand({ marks: [{ month: '2022-03' }, { month: '2025-01', result: 'condemned' }] }).lastMonth).toBe('2022-03')
    expect(stand({ marks: [{ month: '2022-03' }, { month: '2025-01', result: 'passed' }] }).lastMonth).toBe('2025-01')
  })

  it('is moved by an outside look only where the owner allows it, and then by five years at most', () => {
    const marks = [{ month: '2018-03' }, { month: '2023-03', suffix: 'E' }]
    expect(stand({ marks }).lastMonth).toBe('2018-03')
    expect(stand({ marks, visualCounts: true, intervalMonthsSetting: 144 })).toMatchObject({ lastMonth: '2023-03', dueMonth: '2028-03' })
    expect(stand({ marks: [{ month: '2023-03', method: 'visual' }], madeMonth: null }).state).toBe('unknown')
  })

  it('is ten years at most after a proof pressure test, twelve after a volumetric one', () => {
    const twelve = { intervalMonthsSetting: 144 }
    expect(stand({ ...twelve, marks: [{ month: '2020-03', suffix: 'S' }] }).dueMonth).toBe('2030-03')
    expect(stand({ ...twelve, marks: [{ month: '2020-03', method: 'proof' }] }).dueMonth).toBe('2030-03')
    expect(stand({ ...twelve, marks: [{ month: '2020-03', method: 'volumetric' }] }).dueMonth).toBe('2032-03')
    expect(stand({ ...twelve, marks: [], madeMonth: '2020-03' }).dueMonth).toBe('2032-03')
  })
})

describe('the state of a cylinder\'s test', () => {
  it('is in date through the last moment of the due month in the firm\'s zone', () => {
    expect(stand({ nowMs: END_OF_MARCH }).state).toBe('due-soon')
    expect(stand({ nowMs: END_OF_MARCH + 1 }).state).toBe('overdue')
    // The same moment is still March in Honolulu.
    expect(stand({ nowMs: END_OF_MARCH + 1, timeZone: 'Pacific/Honolulu' }).state).toBe('due-soon')
  })

  it('is due soon from 120 days before the end of the due month', () => {
    // 1 December 2026 to 31 March 2027: 120 days.
    expect(stand({ nowMs: Date.UTC(2026, 11, 1, 18) }).state).toBe('due-soon')
    expect(stand({ nowMs: Date.UTC(2026, 10, 30, 18) }).state).toBe('in-date')
  })

  it('is due soon from as many days before as the firm sets', () => {
    expect(stand({ nowMs: Date.UTC(2027, 2, 1, 18), soonDays: 30 }).state).toBe('due-soon')
    expect(stand({ nowMs: Date.UTC(2027, 1, 28, 18), soonDays: 30 }).state).toBe('in-date')
  })

  it('is unknown without a date or without a period', () => {
    expect(stand({ marks: [], madeMonth: null })).toMatchObject({ lastMonth: null, dueMonth: null, state: 'unknown', intervalMonths: 60 })
    expect(stand({ spec: 'DOT-SP' })).toMatchObject({ lastMonth: '2022-03', dueMonth: null, state: 'unknown' })
    expect(stand({ spec: 'DOT-SP', intervalMonthsSetting: 120 })).toMatchObject({ dueMonth: '2032-03', state: 'in-date' })
  })

  it.each(['DOT-3E', 'DOT-4L', 'DOT-39'])('is not required for a %s', (spec) => {
    expect(stand({ spec, nowMs: Date.UTC(2050, 0, 1) })).toMatchObject({ state: 'not-required', dueMonth: null, intervalMonths: null })
  })
})
