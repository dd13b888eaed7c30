import { describe, expect, it } from 'vitest'
import { corrected, CUSTOMER, CYLINDER, did, filled, folded, idOf, kg, recorded, registered, SUPERVISOR, TECHNICIAN, type Told } from '~~/tests/helpers/custody'
import { jobCorrections } from '~~/utils/jobs/jobCorrections'
import { jobLines, recoveredGrams, type JobContext } from '~~/utils/jobs/jobFills'

const JOB = '0198f000-0000-7000-8000-0000000000d1'
const OTHER_JOB = '0198f000-0000-7000-8000-0000000000d2'

function linesOf(story: Told[], jobId = JOB) {
  const moved = new Map<string, number>()
  for (const { eventId, cause, grams } of folded(...story).movements) {
    if (cause === 'recovered' || cause.startsWith('drawn')) moved.set(eventId, (moved.get(eventId) ?? 0) + grams)
  }
  const context: JobContext = {
    moved,
    scales: new Map([['s1', { id: 's1', name: 'Truck scale', accuracyGrams: 10, accuracyPercent: 0, lastCheck: null }]]),
    required: { level: { unit: 'inHg-vacuum', value: 10 }, alternative: null },
    cylinder: id => ({ id, labelCode: '7K3M9Q2TX', serial: 'A1001' }),
    person: id => ({ id, name: id === TECHNICIAN ? 'Tina' : 'Sam', certification: id === TECHNICIAN ? 'Type II' : null }),
  }
  return jobLines(jobId, [recorded(...story)], context)
}

const start = registered()
const ofJob = (gross: number, details: object = {}, more: Told['more'] = {}) => filled('R-22', gross, { jobId: JOB, ...details }, more)

describe('what was recovered on a job', () => {
  it('is what its fills weighed, with cylinder, weights, method, owner and who did it', () => {
    const { fills } = linesOf([start, ofJob(20, { grossBefore: kg(12), method: 'push-pull', ownerOfRefrigerantId: CUSTOMER })])
    expect(fills).toEqual([{
      eventId: idOf(1), cylinder: { id: CYLINDER, labelCode: '7K3M9Q2TX', serial: 'A1001' }, at: '2026-07-01T18:00:00.000Z', refrigerant: 'R-22', condition: null,
      grossBefore: kg(12), grossAfter: kg(20), netGrams: 8_000,
      // Without a named scale 0.5 % of either reading: 60 and 100 g.
      uncertaintyGrams: 160,
      method: 'push-pull', reached: null, by: { id: TECHNICIAN, name: 'Tina', certification: 'Type II' }, supervisor: null, ownerId: CUSTOMER, apart: null, corrected: false,
    }])
  })

  it('leaves out fills of no job and of another', () => {
    const story = [start, filled('R-22', 14), filled('R-22', 16, { jobId: OTHER_JOB }), ofJob(17)]
    expect(linesOf(story).fills.map(({ netGrams }) => netGrams)).toEqual([1_000])
    expect(linesOf(story, OTHER_JOB).fills.map(({ netGrams }) => netGrams)).toEqual([2_000])
  })

  it('is not known where nobody knows the weight before, and is never nothing then', () => {
    const { fills } = linesOf([registered({ contents: 'unknown' }), ofJob(20)])
    expect(fills[0]).toMatchObject({ netGrams: null, uncertaintyGrams: null, grossBefore: null })
    expect(recoveredGrams(fills)).toBeNull()
  })

  it('is nothing where both weights are the same', () => {
    expect(linesOf([start, ofJob(12, { grossBefore: kg(12) })]).fills[0]).toMatchObject({ netGrams: 0 })
  })

  it('has the accuracy of the scale that was named', () => {
    expect(linesOf([start, ofJob(20, { grossBefore: kg(12), scaleId: 's1' })]).fills[0]!.uncertaintyGrams).toBe(20)
  })

  it('follows the log: what a correction says stands, what it takes out is gone, and one that names the job brings its fill along', () => {
    const mended = linesOf([start, ofJob(20), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(21), jobId: JOB })])
    expect(mended.fills).toMatchObject([{ netGrams: 9_000, corrected: true }])
    expect(linesOf([start, ofJob(20), corrected(idOf(1))]).fills).toEqual([])
    expect(linesOf([start, filled('R-22', 20), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(20), jobId: JOB })]).fills).toMatchObject([{ netGrams: 8_000 }])
    expect(linesOf([start, ofJob(20), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(20) })]).fills).toEqual([])
  })

  it('stands apart as practice, and while a trainee\'s entry waits for its signature', () => {
    const byTrainee = ofJob(20, {}, { trainee: true, supervisorId: SUPERVISOR })
    const signed = did('countersigned', { eventId: idOf(1) }, { actorId: SUPERVISOR })
    expect(linesOf([start, ofJob(20, {}, { practice: true })]).fills).toMatchObject([{ apart: 'practice' }])
    expect(linesOf([start, byTrainee]).fills).toMatchObject([{ apart: 'unsigned', supervisor: { name: 'Sam' } }])
    expect(linesOf([start, byTrainee, signed]).fills).toMatchObject([{ apart: null }])
  })

  it('is summed without what stands apart', () => {
    expect(recoveredGrams([{ netGrams: 500, apart: null }, { netGrams: 700, apart: 'practice' }, { netGrams: null, apart: null }, { netGrams: 1, apart: null }])).toBe(501)
    expect(recoveredGrams([{ netGrams: 700, apart: 'unsigned' }])).toBeNull()
  })

  it('is judged by the vacuum that was read, on both sides of the required one', () => {
    const reached = (inHg: number) => linesOf([start, ofJob(20, { reached: { vacuum: { inHg }, heldMinutes: 5 } })]).fills[0]!.reached
    expect(reached(10)).toMatchObject({ verdict: 'reached', heldMinutes: 5 })
    expect(reached(9.9)).toMatchObject({ verdict: 'not-reached' })
  })

  it('has what went back beside it', () => {
    const { draws } = linesOf([start, ofJob(20), did('drawn', { grossAfter: kg(15), purpose: 'same-system', jobId: JOB })])
    expect(draws).toMatchObject([{ netGrams: 5_000, purpose: 'same-system', apart: null, by: { name: 'Tina' } }])
  })
})

describe('the corrections of a job', () => {
  const of = (story: Told[]) => jobCorrections(JOB, [recorded(...story)]).map(({ eventId }) => eventId)

  it('are those of its fills, of those that came to it and of those that left it, each once', () => {
    expect(of([start, ofJob(20)])).toEqual([])
    expect(of([start, ofJob(20), corrected(idOf(1))])).toEqual([idOf(2)])
    expect(of([start, filled('R-22', 20), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(20), jobId: JOB.toUpperCase() })])).toEqual([idOf(2)])
    expect(of([start, ofJob(20), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(20) })])).toEqual([idOf(2)])
  })

  it('are corrections of corrections too, not those of other entries', () => {
    const story = [start, ofJob(20), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(21), jobId: JOB }), corrected(idOf(2)), filled('R-22', 22), corrected(idOf(4))]
    expect(of(story)).toEqual([idOf(2), idOf(3)])
  })
})
