import { describe, expect, it } from 'vitest'
import type { MassReading } from '~~/utils/quantity/mass'
import { jobCautions, type JudgedJob } from '~~/utils/jobs/jobCautions'
import type { JobFill } from '~~/utils/contract/jobs'

const REACHED = { verdict: 'reached', because: 'deep enough', shortBy: null, absoluteMmHg: 100, heldMinutes: 5 } as const
const SHORT = { ...REACHED, verdict: 'not-reached', because: '2 inHg short', shortBy: 2 } as const
const lb = (value: number): MassReading => ({ unit: 'lb', value })

function fill(more: Partial<JobFill> = {}): JobFill {
  return {
    eventId: 'e', cylinder: { id: 'c', labelCode: null, serial: null }, at: '2026-07-01T18:00:00.000Z', refrigerant: 'R-22', condition: null, grossBefore: null,
    grossAfter: lb(40), netGrams: 2_000, uncertaintyGrams: 100, method: null, reached: REACHED, by: { id: 'p', name: 'Tina', certification: 'Type II' },
    supervisor: null, ownerId: null, apart: null, corrected: false, ...more,
  }
}
const codes = (fills: JobFill[], job: Partial<JudgedJob> = {}) => jobCautions({ refrigerant: 'R-22', charge: null, ...job }, fills).map(({ code }) => code)

describe('a job wants nothing', () => {
  it('where the vacuum was reached by a certified technician, or nothing was recovered yet', () => {
    expect(codes([fill()])).toEqual([])
    expect(codes([])).toEqual([])
  })
})

describe('a job is cautioned', () => {
  it('where the last vacuum that was read was not deep enough, or none was read', () => {
    expect(codes([fill({ reached: SHORT })])).toEqual(['vacuum-level'])
    expect(codes([fill({ reached: null })])).toEqual(['vacuum-level'])
    expect(codes([fill({ reached: SHORT }), fill()])).toEqual([])
    expect(codes([fill(), fill({ reached: null })])).toEqual([])
    expect(codes([fill(), fill({ reached: SHORT })])).toEqual(['vacuum-level'])
  })

  it('where the system\'s own compressor did it on a charge above 15 lb', () => {
    expect(codes([fill({ method: 'own-compressor' })], { charge: lb(15) })).toEqual([])
    expect(codes([fill({ method: 'own-compressor' })], { charge: lb(15.01) })).toEqual(['system-dependent-limit'])
    expect(codes([fill({ method: 'fixed-pump-out' })], { charge: lb(20) })).toEqual([])
  })

  it('where more came out than the charge, beyond what the scales may be off', () => {
    const charge: MassReading = { unit: 'kg', value: 1.9 }
    expect(codes([fill({ netGrams: 2_000, uncertaintyGrams: 100 })], { charge })).toEqual([])
    expect(codes([fill({ netGrams: 2_001, uncertaintyGrams: 100 })], { charge })).toEqual(['weigh-again'])
  })

  it('where two refrigerants are named', () => {
    expect(codes([fill({ refrigerant: 'R-410A' })])).toEqual(['two-refrigerants'])
    expect(codes([fill({ refrigerant: null })])).toEqual([])
  })

  it('where a charge above 5 and under 50 lb has no refrigerant for the record of a disposal', () => {
    const unnamed = [fill({ refrigerant: null, netGrams: null, uncertaintyGrams: null })]
    const of = (charge: number) => codes(unnamed, { refrigerant: null, charge: lb(charge) })
    expect(of(5)).toEqual([])
    expect(of(5.01)).toEqual(['disposal-record'])
    expect(of(49.99)).toEqual(['disposal-record'])
    expect(of(50)).toEqual([])
    expect(codes(unnamed, { charge: lb(10) })).toEqual([])
  })

  it('where nobody certified did or supervised it', () => {
    const by = { id: 'q', name: 'Pia', certification: null }
    expect(codes([fill({ by })])).toEqual(['not-certified'])
    expect(codes([fill({ by, supervisor: { id: 'p', name: 'Tina', certification: 'Universal' } })])).toEqual([])
  })

  it('not for practice', () => {
    expect(codes([fill({ apart: 'practice', reached: SHORT })])).toEqual([])
  })
})
