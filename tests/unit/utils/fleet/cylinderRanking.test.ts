import { describe, expect, it } from 'vitest'
import { CUSTOMER, did, filled, registered, STAMP, viewAfter, type Told } from '~~/tests/helpers/custody'
import type { Reach } from '~~/utils/contract/ranking'
import { fillPair, rankCylinders, type Candidate } from '~~/utils/fleet/cylinderRanking'

// Each takes 16,000 g of R-22 up to its stop weight of 28.00 kg.
const asked = { refrigerant: 'R-22', grams: 4_000 }
const empty = [registered()]
const notEvacuated = [registered(), did('emptied', {})]
const at = (kg: number) => [registered(), filled('R-22', kg)]
const soon = { ...STAMP, madeMonth: '2021-09' } as const

function candidate(id: string, story: Told[], reach: Reach = 'van'): Candidate {
  return { view: { ...viewAfter(story, { askedRefrigerant: 'R-22' }), id, labelCode: null }, reach }
}

function ranking(...candidates: Candidate[]) {
  return rankCylinders(candidates, asked)
}

const ids = (cylinders: { view: { id: string } }[]) => cylinders.map(({ view }) => view.id)
const only = (story: Told[]) => ranking(candidate('it', story))[0]!

describe('which cylinder takes 4 kg of R-22', () => {
  it('is the one on the van before one at hand before one in the shop', () => {
    expect(ids(ranking(candidate('shop', at(20), 'shop'), candidate('held', at(20), 'held'), candidate('van', empty, 'van')))).toEqual(['van', 'held', 'shop'])
  })

  it('is the one in the shop where the van has not enough room for all of it', () => {
    // 24.001 kg on the scale leave 3,999 g of room.
    const [first, second] = ranking(candidate('van', at(24.001)), candidate('shop', at(20), 'shop'))
    expect(first).toMatchObject({ fit: 'whole', roomGrams: 8_000, view: { id: 'shop' } })
    expect(second).toMatchObject({ fit: 'part', roomGrams: 3_999, view: { id: 'van' } })
  })

  it('is one with room for exactly as much', () => {
    expect(only(at(24))).toMatchObject({ fit: 'whole', roomGrams: 4_000 })
  })

  it('is the one that holds it, then one kept for it, then one evacuated', () => {
    expect(ids(ranking(
      candidate('evacuated', empty), candidate('kept', [registered({ dedicatedTo: 'R-22' })]), candidate('holds', at(20)),
    ))).toEqual(['holds', 'kept', 'evacuated'])
  })

  it('is the smallest room that suffices, so that the large one stays free', () => {
    expect(ids(ranking(candidate('8 kg', at(20)), candidate('5 kg', at(23)), candidate('9 kg', at(19))))).toEqual(['5 kg', '8 kg', '9 kg'])
  })

  it('is one in date for long before one whose retest is near', () => {
    const [first, last] = ranking(candidate('soon', [registered({ stamp: soon }), filled('R-22', 20)]), candidate('evacuated', empty))
    expect(first!.view.id).toBe('evacuated')
    expect(last!.reasons).toEqual(['holds R-22', 'retest soon'])
  })

  it('is one that is empty without a vacuum only after those evacuated', () => {
    const ranked = ranking(candidate('emptied', notEvacuated), candidate('evacuated', empty))
    expect(ids(ranked)).toEqual(['evacuated', 'emptied'])
    expect(ranked[1]!.reasons).toEqual(['empty, not evacuated'])
  })

  it('is none that mixes clean with burnt while a clean way is open', () => {
    const burnt = [registered(), filled('R-22', 20, { condition: 'burnt' })]
    expect(ids(ranking(candidate('burnt', burnt), candidate('evacuated', empty)))).toEqual(['evacuated', 'burnt'])
    expect(only(burnt).reasons[0]).toBe('holds burnt R-22')
  })
})

describe('a cylinder about which something is to be settled', () => {
  const anothers = [registered(), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER })]
  const twoOwners = [...anothers, filled('R-22', 21)]
  const onTwo: Candidate = { view: { ...viewAfter([registered(), did('labelled', { code: '7K3M9Q2TX' })], { codesOnTwo: new Set(['7K3M9Q2TX']), askedRefrigerant: 'R-22' }), id: 'on two' }, reach: 'van' }

  it.each([
    ['holds another owner\'s', candidate('it', anothers), 'what is in it is not ours: only the same owner\'s may go on top'],
    ['holds two owners\'', candidate('it', twoOwners), 'two owners'],
    ['shares its code', onTwo, 'one code on two'],
  ] as [string, Candidate, string][])('says so, and stands behind one in the shop that needs nothing: it %s', (_, it, why) => {
    const [first, last] = ranking(it, candidate('shop', at(20), 'shop'))
    expect(first).toMatchObject({ fit: 'whole', view: { id: 'shop' }, reasons: ['holds R-22'] })
    expect(last).toMatchObject({ fit: 'whole', reasons: expect.arrayContaining([why]) })
  })
})

describe('a cylinder that is not weighed', () => {
  const unweighed = [...at(20), did('lost', { cause: 'hose' })]

  it('promises no room: it is to be weighed first, and stands behind those that have room', () => {
    expect(only(unweighed)).toMatchObject({ fit: 'not-weighed', roomGrams: null })
    expect(only(unweighed).reasons).toEqual(['not weighed: weigh it first', 'holds R-22'])
    expect(ids(ranking(candidate('unweighed', unweighed), candidate('part', at(27), 'shop')))).toEqual(['part', 'unweighed'])
  })
})

describe('a cylinder that may not take it', () => {
  it.each([
    ['holds another', [registered(), filled('R-134a', 20)], 'holds R-134a'],
    ['is kept for another', [registered({ dedicatedTo: 'R-134a' })], 'kept for R-134a'],
    ['holds nobody knows what', [registered({ contents: 'unknown' })], 'what is in it is not known'],
    ['is full', at(28), 'nearly full'],
    ['is overfilled', at(29), 'overfilled'],
    ['is overdue', [registered({ stamp: { ...STAMP, madeMonth: '2019-03' } })], 'retest overdue'],
    ['has no known tare', [registered({ stamp: { ...STAMP, tareWeight: null } })], 'not known: its tare weight (TW)'],
  ] as [string, Told[], string][])('says why: it %s', (_, story, why) => {
    expect(only(story)).toMatchObject({ fit: 'refused', roomGrams: null, reasons: [why] })
  })

  it('stands last, however near it is', () => {
    expect(ids(ranking(candidate('overfilled', at(29)), candidate('unweighed', [...at(20), did('lost', { cause: 'hose' })], 'shop')))).toEqual(['unweighed', 'overfilled'])
  })
})

describe('two cylinders', () => {
  const pair = (...candidates: Candidate[]) => fillPair(ranking(...candidates), asked)

  it('are named where no single one suffices: the first to its stop weight, the rest in the second', () => {
    // Rooms of 3,000, 2,500 and 1,000 g: 3,000 and 1,000 come to exactly 4,000.
    const two = pair(candidate('2.5', at(25.5)), candidate('3', at(25)), candidate('1', at(27)))!
    expect(two.map(({ cylinder, grams }) => [cylinder.view.id, grams])).toEqual([['3', 3_000], ['1', 1_000]])
  })

  it('are not needed where one suffices, and not named where two do not', () => {
    expect(pair(candidate('4', at(24)), candidate('3', at(25)))).toBeNull()
    expect(pair(candidate('2', at(26)), candidate('1.999', at(26.001)))).toBeNull()
    expect(pair(candidate('2', at(26)), candidate('also 2', at(26)))).not.toBeNull()
  })

  it('are the two on the van before a closer fit in the shop', () => {
    const two = pair(candidate('van 3', at(25)), candidate('van 2', at(26)), candidate('shop 1', at(27), 'shop'))!
    expect(ids(two.map(({ cylinder }) => cylinder))).toEqual(['van 3', 'van 2'])
  })
})
