import { describe, expect, it } from 'vitest'
import { asksAgain, registrationDoubts } from '../../../../utils/registration/doubts'
import { emptyDraft, type RegistrationDraft } from '../../../../utils/registration/draft'

const lb = (value: number) => ({ unit: 'lb' as const, value })

function draft(change: Partial<RegistrationDraft> = {}): RegistrationDraft {
  return {
    ...emptyDraft(), serial: 'K48266', spec: 'DOT-4BA400', tareWeight: lb(27.5), waterCapacity: lb(47.6), made: '03-21',
    marks: [{ month: '04-26', rin: 'Z000', suffix: '' }], flammableMarked: false, floatSwitch: false, contents: 'evacuated', placeId: 'p', ...change,
  }
}

function doubtful(change: Partial<RegistrationDraft>, serialTaken: boolean | null = false): string[] {
  return registrationDoubts(draft(change), '2026-12', 'lb', serialTaken).filter(doubt => doubt.kind === 'att').map(doubt => doubt.code)
}

describe('a second look at a stamp', () => {
  it('asks nothing where every figure fits the others', () => {
    expect(doubtful({})).toEqual([])
    expect(asksAgain(registrationDoubts(draft(), '2026-12', 'lb', false))).toBe(false)
  })

  it('asks where WC is less than 1.2 times or more than 2.5 times TW', () => {
    expect(doubtful({ tareWeight: lb(20), waterCapacity: lb(24) })).toEqual([])
    expect(doubtful({ tareWeight: lb(20), waterCapacity: lb(23.9) })).toEqual(['ratio'])
    expect(doubtful({ tareWeight: lb(20), waterCapacity: lb(50) })).toEqual([])
    expect(doubtful({ tareWeight: lb(20), waterCapacity: lb(50.1) })).toEqual(['ratio'])
  })

  it('asks where TW was read in another unit than WC', () => {
    expect(doubtful({ tareWeight: { unit: 'kg', value: 27.5 } })).toEqual(['ratio'])
  })

  // At 27.3 lb a scale may be off by half a percent, 0.1365 lb or 62 g.
  it('asks where the scale shows less than TW, beyond what the scale may be off', () => {
    expect(doubtful({ gross: lb(27.4) })).toEqual([])
    expect(doubtful({ gross: lb(27.3) })).toEqual(['gross-below-tare'])
  })

  it('asks where an evacuated cylinder weighs more than empty', () => {
    expect(doubtful({ gross: lb(30) })).toEqual(['evacuated-but-heavy'])
    expect(doubtful({ gross: lb(30), contents: 'unknown' })).toEqual([])
  })

  it('asks about a month that has not come and a test before the cylinder was made', () => {
    expect(doubtful({ marks: [{ month: '12-26', rin: '', suffix: '' }] })).toEqual([])
    expect(doubtful({ marks: [{ month: '01-27', rin: '', suffix: '' }] })).toEqual(['month-ahead'])
    expect(doubtful({ marks: [{ month: '02-21', rin: '', suffix: '' }] })).toEqual(['test-before-made'])
  })

  it('asks about a suffix that no retest mark has, wherever it is typed', () => {
    expect(doubtful({ marks: [{ month: '04-26', rin: 'Z000', suffix: 's' }] })).toEqual([])
    expect(doubtful({ marks: [{ month: '04-26', rin: 'Z000', suffix: 'V' }] })).toEqual(['suffix'])
    expect(doubtful({ marks: [{ month: '4 Z000 26 DT', rin: '', suffix: '' }] })).toEqual(['suffix'])
  })

  it('asks about a serial that the fleet knows already, and only then', () => {
    expect(doubtful({}, true)).toEqual(['serial-taken'])
    expect(doubtful({}, null)).toEqual([])
  })

  it('asks about a cylinder that may never be refilled', () => {
    expect(doubtful({ spec: 'DOT-39 NRC' })).toEqual(['not-refillable'])
  })
})
