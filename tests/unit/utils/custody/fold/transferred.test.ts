import { describe, expect, it } from 'vitest'
import {
  codes, contentsAfter, CUSTOMER, did, filled, folded, idOf, kg, lastFindings, lastMovements, OTHER_CYLINDER, registered, SHIPMENT, START, viewAfter, type Told,
} from '~~/tests/helpers/custody'
import type { DetailsOf } from '~~/utils/custody/schema'
import type { Half } from '~~/utils/custody/half'

const TRANSFER = '0198f000-0000-7000-8000-0000000000d1'

const half = (direction: 'out' | 'in', afterKg: number, details: Partial<DetailsOf<'transferred'>> = {}, more: Told['more'] = {}) => did('transferred', {
  direction, counterpartId: OTHER_CYLINDER, transferId: TRANSFER, refrigerant: 'R-22', condition: 'clean', grossAfter: kg(afterKg), ...details,
}, more)
const out = (afterKg: number, details: Partial<DetailsOf<'transferred'>> = {}) => half('out', afterKg, details)
const into = (afterKg: number, details: Partial<DetailsOf<'transferred'>> = {}) => half('in', afterKg, details)
const holding = (refrigerant: string, grossKg = 20) => registered({ contents: { refrigerant, condition: 'clean' }, gross: kg(grossKg) })

describe('what goes out of a cylinder into another', () => {
  it('is the difference of the scale, and leaves the name', () => {
    const story = [holding('R-22'), out(15)]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-22', condition: 'clean', netGrams: 3000 })
    expect(lastMovements(...story)).toEqual(['transferred-out R-22 -5000'])
    expect(lastFindings(...story)).toEqual([])
  })

  it('counts what the scale showed before as a weighing', () => {
    expect(lastMovements(holding('R-22'), out(15, { grossBefore: kg(19.9) }))).toEqual(['weighing R-22 -100', 'transferred-out R-22 -4900'])
  })

  it('goes by share where two own it, the last gram of the larger', () => {
    const story = [registered(), filled('R-22', 14), filled('R-22', 18.001, { ownerOfRefrigerantId: CUSTOMER })]
    // 2,000 g and 4,001 g; of 3,001 g the shares are 1,000.2 and 2,000.8.
    expect(lastMovements(...story, out(15))).toEqual(['transferred-out R-22 -1000', 'transferred-out R-22 -2001 f1'])
  })

  it('is not known where nothing was weighed before, and says so', () => {
    const story = [registered({ contents: { refrigerant: 'R-22', condition: 'clean' } }), out(15)]
    expect(contentsAfter(...story).netGrams).toBe(3000)
    expect(lastMovements(...story)).toEqual(['opening R-22 3000'])
    expect(lastFindings(...story)).toEqual(['weight-not-known'])
  })

  it('that is heavier after than before is a reading to look at again, not a gain', () => {
    const story = [holding('R-22'), out(20.5)]
    expect(lastMovements(...story)).toEqual(['weighing R-22 500'])
    expect(lastFindings(...story)).toEqual(['weigh-again'])
  })

  it('keeps the name of what is in it, whatever the half calls it', () => {
    expect(contentsAfter(holding('R-22'), out(15, { refrigerant: 'R-410A', condition: 'burnt' }))).toMatchObject({ refrigerant: 'R-22', condition: 'clean', burnt: false })
  })
})

describe('what comes into a cylinder out of another', () => {
  it('makes an evacuated cylinder hold it by name and condition', () => {
    const story = [registered(), into(17, { condition: 'suspect', grossBefore: kg(12) })]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-22', condition: 'suspect', netGrams: 5000, nothingInIt: false, evacuated: false })
    expect(lastMovements(...story)).toEqual(['transferred-in R-22 5000'])
  })

  it('leaves the worse of both words, and burnt once burnt', () => {
    expect(contentsAfter(holding('R-22', 14), into(17, { condition: 'suspect' })).condition).toBe('suspect')
    expect(contentsAfter(registered({ contents: { refrigerant: 'R-22', condition: 'suspect' }, gross: kg(14) }), into(17)).condition).toBe('suspect')
    const burnt = [holding('R-22', 14), into(17, { condition: 'burnt' })]
    expect(contentsAfter(...burnt)).toMatchObject({ condition: 'burnt', burnt: true })
    expect(viewAfter(burnt).capacity.governingRule).toBe('oily')
  })

  it('onto another refrigerant is a mixture, with a stop', () => {
    const story = [holding('R-22', 14), into(17, { refrigerant: 'R-410A' })]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, condition: 'mixed', netGrams: 5000 })
    expect(lastFindings(...story)).toContain('second-refrigerant')
    expect(lastMovements(...story)).toEqual(['renamed R-22 -2000', 'renamed ? 2000', 'transferred-in R-410A 3000', 'renamed R-410A -3000', 'renamed ? 3000'])
  })

  it('of a name that nobody knows makes a known one unknown', () => {
    const story = [holding('R-22', 14), into(17, { refrigerant: null, condition: 'unknown' })]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, condition: 'unknown' })
    expect(lastFindings(...story)).toContain('unknown-onto-known')
  })

  it('is overfilled above its limit and not at it', () => {
    const story = (grossKg: number) => lastFindings(registered(), into(grossKg))
    expect(story(28)).not.toContain('overfill')
    expect(story(28.01)).toContain('overfill')
  })

  it('belongs to whom the half names', () => {
    expect(contentsAfter(holding('R-22', 14), into(17, { ownerOfRefrigerantId: CUSTOMER })).shares).toEqual([{ ownerId: null, grams: 2000 }, { ownerId: CUSTOMER, grams: 3000 }])
  })

  it('counts as put in here: by today\'s rule or that day\'s, and never into a DOT-39', () => {
    expect(folded(registered(), into(17)).state).toMatchObject({ filledHere: true, lastPutInAt: START + 3_600_000 })
    const disposable = registered({ stamp: { serial: 'D1', spec: 'DOT-39', servicePressurePsig: 400, tareWeight: kg(12), waterCapacity: kg(20), madeMonth: '2024-03', flammableMarked: true } })
    expect(codes(viewAfter([disposable, into(17)]))).toContain('not-refillable')
  })

  it('brings a cylinder back that was away, with a finding', () => {
    const story = [registered(), did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(12) }), into(17)]
    expect(folded(...story).state.away).toBeNull()
    expect(lastFindings(...story)).toContain('away')
  })
})

describe('the half that a transfer leaves in the log', () => {
  const halvesOf = (...story: Told[]) => folded(...story).state.halves

  it('says what went over by its two weights, and how far they may be off', () => {
    // 0.5 % of 20,000 g and of 15,000 g.
    expect(halvesOf(holding('R-22'), out(15, { grossBefore: kg(20) }))).toEqual([{
      eventId: idOf(1), kind: 'transferred', pairId: TRANSFER, cylinderId: expect.any(String), otherId: OTHER_CYLINDER, direction: 'out', at: START + 3_600_000,
      transfer: { refrigerant: 'R-22', grams: 5000, accuracyGrams: 175 },
    } satisfies Half])
  })

  it('takes the reading that the net rests on where nobody weighed before', () => {
    expect(halvesOf(holding('R-22'), out(15))[0]!.transfer).toEqual({ refrigerant: 'R-22', grams: 5000, accuracyGrams: 175 })
    expect(halvesOf(registered({ contents: 'unknown' }), into(17))[0]!.transfer).toMatchObject({ grams: null })
  })

  it('takes the tare where nothing was in it and nobody weighed it: a scale is good to 60 g there', () => {
    // 12.00 kg of tare to 17.00 kg; 60 g and 85 g.
    expect(halvesOf(registered(), into(17))[0]!.transfer).toEqual({ refrigerant: 'R-22', grams: 5000, accuracyGrams: 145 })
  })

  it('is gone with an event that was taken out, and changed with one that was corrected', () => {
    const story = [holding('R-22'), out(15)]
    expect(halvesOf(...story, did('corrected', { eventId: idOf(1), reason: 'not done' }))).toEqual([])
    const instead = { ...(out(16).details as Record<string, unknown>) }
    expect(halvesOf(...story, did('corrected', { eventId: idOf(1), reason: 'a slip', instead }))[0]!.transfer).toMatchObject({ grams: 4000 })
  })
})
