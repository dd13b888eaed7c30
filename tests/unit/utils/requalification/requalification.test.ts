import { describe, expect, it } from 'vitest'
import type { OwnerChoice } from '~~/utils/requalification/ownerChoice'
import { requalification, type RequalificationInput } from '~~/utils/requalification/requalification'
import type { Steel } from '~~/utils/requalification/testPeriod'

const CHICAGO = 'America/Chicago'
// The last millisecond of March 2027 in Chicago, which keeps summer time by then.
const END_OF_MARCH = Date.UTC(2027, 3, 1, 5) - 1

const CLEAN = { isOwn: true, dedicatedTo: null, holds: [], hasHeldBurnt: false }
const E: OwnerChoice = { paragraph: '180.209(e)', reason: 'coated, analyzed refrigerant only', from: null }
const G: OwnerChoice = { paragraph: '180.209(g)', reason: 'looked at by a RIN holder', from: null }

type Changes = Partial<Omit<RequalificationInput, 'steel'>> & { steel?: Partial<Steel>, choices?: OwnerChoice[], months?: number }

function stand({ steel, choices = [], months, ...changes }: Changes = {}) {
  return requalification({
    steel: { spec: 'DOT-4BA', madeMonth: '2012-06', waterCapacityGrams: 22_000, service: CLEAN, ...steel },
    marks: [{ month: '2022-03' }],
    nowMs: Date.UTC(2026, 5, 1),
    timeZone: CHICAGO,
    rules: { intervalMonths: months ?? null, ownerChoices: choices },
    ...changes,
  })
}

describe('the due month', () => {
  it('is five years after the last test', () => {
    expect(stand()).toEqual({
      lastMonth: '2022-03', intervalMonths: 60, dueMonth: '2027-03', state: 'in-date', choice: null,
      basis: 'Tested March 2022; due 60 months later by 49 CFR 180.209(a), Table 1, for DOT-4BA.',
    })
  })

  it('counts from the latest mark, in whatever order they are read', () => {
    expect(stand({ marks: [{ month: '2024-05' }, { month: '2019-04' }] }).dueMonth).toBe('2029-05')
    expect(stand({ marks: [{ month: '2019-04' }, { month: '2024-05' }] }).dueMonth).toBe('2029-05')
  })

  it('counts from the month it was made before the first test', () => {
    const untested = stand({ marks: [], steel: { madeMonth: '2023-01' } })
    expect(untested).toMatchObject({ lastMonth: '2023-01', dueMonth: '2028-01', state: 'in-date' })
    expect(untested.basis).toContain('Made January 2023; due 60 months later')
  })

  it('is not moved by a mark that lies ahead, nor by a month of making that does', () => {
    const nowMs = Date.UTC(2026, 5, 15)
    expect(stand({ marks: [{ month: '2022-03' }, { month: '2026-06' }], nowMs }).dueMonth).toBe('2031-06')
    expect(stand({ marks: [{ month: '2022-03' }, { month: '2026-07' }], nowMs }).dueMonth).toBe('2027-03')
    expect(stand({ marks: [], steel: { madeMonth: '2026-06' }, nowMs }).dueMonth).toBe('2031-06')
    expect(stand({ marks: [], steel: { madeMonth: '2026-07' }, nowMs }).state).toBe('unknown')
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

  it('is moved by an outside look only where the owner chose it, and then by five years', () => {
    const marks = [{ month: '2018-03' }, { month: '2023-03', suffix: 'E' }]
    const left = stand({ marks })
    expect(left).toMatchObject({ lastMonth: '2018-03', dueMonth: '2023-03', state: 'overdue' })
    expect(left.basis).toBe('Tested March 2018; due 60 months later by 49 CFR 180.209(a), Table 1, for DOT-4BA. '
      + 'The outside look of March 2023 does not count: only 49 CFR 180.209(g) lets it stand in for a volumetric test, and no choice of the owner’s covers this cylinder.')
    const counted = stand({ marks, choices: [G] })
    expect(counted).toMatchObject({ lastMonth: '2023-03', dueMonth: '2028-03', choice: G })
    expect(counted.basis).toBe('Tested March 2023; due 60 months later by 49 CFR 180.209(g), as the owner chose: looked at by a RIN holder.')
    expect(stand({ marks, choices: [E, G] })).toMatchObject({ lastMonth: '2023-03', dueMonth: '2028-03' })
    expect(stand({ marks: [{ month: '2023-03', method: 'visual' }], steel: { madeMonth: null } }).state).toBe('unknown')
  })

  it('is moved by a proof pressure test only where the owner chose (e), and then by ten years', () => {
    const marks = [{ month: '2021-03' }, { month: '2024-03', suffix: 'S' }]
    const left = stand({ marks })
    expect(left).toMatchObject({ lastMonth: '2021-03', dueMonth: '2026-03' })
    expect(left.basis).toContain('The proof pressure test of March 2024 does not count: only 49 CFR 180.209(e)')
    expect(stand({ marks, choices: [E] })).toMatchObject({ lastMonth: '2024-03', intervalMonths: 120, dueMonth: '2034-03' })
    expect(stand({ marks: [{ month: '2024-03', method: 'proof' }], choices: [E] }).dueMonth).toBe('2034-03')
    expect(stand({ marks: [{ month: '2024-03', method: 'volumetric' }], choices: [E] }).dueMonth).toBe('2036-03')
    expect(stand({ marks: [], steel: { madeMonth: '2020-03' }, choices: [E] }).dueMonth).toBe('2032-03')
  })

  it('goes by the lesser test where the method and the suffix say different ones', () => {
    expect(stand({ marks: [{ month: '2024-03', method: 'volumetric', suffix: 'S' }], choices: [E] }).dueMonth).toBe('2034-03')
    expect(stand({ marks: [{ month: '2024-03', method: 'proof', suffix: 'E' }], choices: [E, G] }).dueMonth).toBe('2029-03')
    expect(stand({ marks: [{ month: '2024-03', method: 'visual', suffix: '*' }], choices: [G] }).dueMonth).toBe('2029-03')
  })

  it('goes by the shorter period of two marks of one month', () => {
    const marks = [{ month: '2024-03' }, { month: '2024-03', suffix: 'S' }]
    expect(stand({ marks, choices: [E] }).dueMonth).toBe('2034-03')
    expect(stand({ marks: [...marks].reverse(), choices: [E] }).dueMonth).toBe('2034-03')
  })

  it('is not moved by a mark whose suffix is none, unless the log says how it was tested', () => {
    const left = stand({ marks: [{ month: '2022-03' }, { month: '2025-03', suffix: 'V' }] })
    expect(left.dueMonth).toBe('2027-03')
    expect(left.basis).toContain('The mark of March 2025 does not count: no test is marked V (49 CFR 180.213).')
    expect(stand({ marks: [{ month: '2025-03', suffix: 'V', method: 'volumetric' }] }).dueMonth).toBe('2030-03')
  })

  it('says that burnt refrigerant takes the owner\'s choice away', () => {
    const burnt = { service: { ...CLEAN, hasHeldBurnt: true } }
    expect(stand({ choices: [E] }).dueMonth).toBe('2034-03')
    expect(stand({ choices: [E], steel: burnt }).dueMonth).toBe('2027-03')
    expect(stand({ choices: [E], steel: burnt }).basis).toContain('Burnt refrigerant was in it, so the owner’s choice does not cover it.')
    expect(stand({ steel: burnt }).basis).not.toContain('Burnt')
  })

  it('says that the owner\'s choice is not for another\'s cylinder', () => {
    const rented = { service: { ...CLEAN, isOwn: false } }
    expect(stand({ choices: [E], steel: rented }).dueMonth).toBe('2027-03')
    expect(stand({ choices: [E], steel: rented }).basis).toContain('It is not the firm’s own, so the owner’s choice does not cover it.')
    expect(stand({ steel: rented }).basis).not.toContain('own,')
  })

  it('goes by the owner\'s own months where they are fewer', () => {
    expect(stand({ months: 36 })).toMatchObject({ intervalMonths: 36, dueMonth: '2025-03' })
    expect(stand({ months: 36 }).basis).toBe('Tested March 2022; due 36 months later by the owner’s own setting.')
    expect(stand({ months: 144 }).dueMonth).toBe('2027-03')
  })
})

describe('the state of a cylinder\'s test', () => {
  it('is in date through the last moment of the due month in the firm\'s zone', () => {
    expect(stand({ nowMs: END_OF_MARCH }).state).toBe('due-soon')
    expect(stand({ nowMs: END_OF_MARCH + 1 }).state).toBe('overdue')
    // The same moment is still March in Honolulu.
    expect(stand({ nowMs: END_OF_MARCH + 1, timeZone: 'Pacific/Honolulu' }).state).toBe('due-soon')
  })

  // The first millisecond of April 2027 by the offset of that night.
  it.each([
    ['Pacific/Kiritimati', 14], ['Asia/Kolkata', 5.5], ['Europe/Berlin', 2], ['UTC', 0], ['America/New_York', -4],
    ['America/St_Johns', -2.5], ['America/Phoenix', -7], ['Pacific/Pago_Pago', -11],
  ])('ends with March at midnight in %s, %d h from UTC', (timeZone, offsetHours) => {
    const firstOfApril = Date.UTC(2027, 3, 1) - offsetHours * 3_600_000
    expect(stand({ nowMs: firstOfApril - 1, timeZone }).state).toBe('due-soon')
    expect(stand({ nowMs: firstOfApril, timeZone }).state).toBe('overdue')
  })

  it('ends with October 2027 in Berlin on winter time, which began that day', () => {
    const october = { marks: [{ month: '2022-10' }], timeZone: 'Europe/Berlin' }
    expect(stand({ ...october, nowMs: Date.UTC(2027, 9, 31, 23) - 1 }).state).toBe('due-soon')
    expect(stand({ ...october, nowMs: Date.UTC(2027, 9, 31, 23) }).state).toBe('overdue')
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
    expect(stand({ marks: [], steel: { madeMonth: null } })).toMatchObject({ lastMonth: null, dueMonth: null, state: 'unknown', intervalMonths: 60 })
    expect(stand({ steel: { spec: 'DOT-SP' } })).toMatchObject({ lastMonth: '2022-03', dueMonth: null, state: 'unknown' })
    expect(stand({ steel: { spec: 'DOT-SP' } }).basis).toBe('Its special permit names its test period, and the owner has not entered that.')
    expect(stand({ steel: { spec: 'DOT-SP' }, months: 120 })).toMatchObject({ dueMonth: '2032-03', state: 'in-date' })
    expect(stand({ steel: { spec: 'DOT-5A' }, months: 60 })).toMatchObject({ dueMonth: null, state: 'unknown' })
  })

  it.each(['DOT-3E', 'DOT-4L', 'DOT-39'])('is not required for a %s, whatever the owner sets', (spec) => {
    expect(stand({ steel: { spec }, nowMs: Date.UTC(2050, 0, 1), months: 60, choices: [E, G] }))
      .toMatchObject({ state: 'not-required', dueMonth: null, intervalMonths: null })
  })
})
