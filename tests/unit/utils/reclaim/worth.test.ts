import { describe, expect, it } from 'vitest'
import type { DatedPrice } from '~~/utils/reclaim/price'
import type { ReclaimerTerms } from '~~/utils/reclaim/terms'
import { isReached, ourLines, worthOffers, worthSum, type Candidate, type Taker } from '~~/utils/reclaim/worth'
import { worthWords } from '~~/utils/reclaim/worthWords'

const DAY = '2026-06-15'
const TERMS: ReclaimerTerms = {
  refrigerants: [{ designation: 'R-22', conditions: ['clean', 'suspect'] }], takesMixed: false, takesUnknown: false, takesOverdue: false,
  specs: null, pressuresPsig: null, mostContaminationPercent: null, minimum: { unit: 'kg', value: 30 }, minimumCylinders: null, pickUpCents: 2000, note: null,
}

function price(mills: number, more: Partial<DatedPrice> = {}): DatedPrice {
  return { id: `${mills}`, refrigerant: 'R-22', condition: 'clean', fromDay: '2026-01-01', untilDay: null, rate: { mills, per: 'kg' }, recordedAt: 0, ...more }
}

function taker(terms: Partial<ReclaimerTerms> = {}, prices: DatedPrice[] = [price(10_000)]): Taker {
  return { id: 'halvern', terms: { ...TERMS, ...terms }, prices }
}

function cylinder(id: string, netGrams: number | null, more: Partial<Candidate> = {}): Candidate {
  return {
    id, netGrams, labelCode: id, serial: null, refrigerant: 'R-22', condition: 'clean', spec: 'DOT-4BA', servicePressurePsig: 400, retest: 'in-date',
    placeId: 'north', ownerIds: [null], isOurSteel: true, heldBack: [], ...more,
  }
}

const only = (candidates: Candidate[], by = taker()) => worthOffers(candidates, [by], DAY)[0] ?? { lines: [], refused: [], refusedCylinders: 0 }
const summed = (candidates: Candidate[], by = taker()) => worthSum(ourLines(only(candidates, by).lines), by.terms)

describe('what a reclaimer would take from a place', () => {
  it('is told by refrigerant, condition and owner, the most worth first', () => {
    const lines = only([
      cylinder('a', 10_000), cylinder('b', 5_000), cylinder('c', 8_000, { condition: 'suspect' }), cylinder('d', 7_000, { ownerIds: ['dairy'] }), cylinder('e', 1_000, { ownerIds: [null, 'dairy'] }),
    ]).lines
    expect(lines.map(({ condition, owner, cylinders, netGrams, valueCents }) => [condition, owner.is, cylinders, netGrams, valueCents])).toEqual([
      ['clean', 'ours', 2, 15_000, 15_000], ['clean', 'customer', 1, 7_000, 7_000], ['clean', 'several', 1, 1_000, 1_000], ['suspect', 'ours', 1, 8_000, null],
    ])
  })

  it('is kept apart by place', () => {
    const offers = worthOffers([cylinder('a', 10_000), cylinder('b', 5_000, { placeId: 'south' })], [taker()], DAY)
    expect(offers.map(({ placeId, lines }) => [placeId, lines[0]?.netGrams])).toEqual([['north', 10_000], ['south', 5_000]])
  })

  it('leaves out what it refuses, each reason with its cylinders, and a cylinder once however many reasons it has', () => {
    const offer = only([
      cylinder('a', 10_000), cylinder('b', 5_000, { refrigerant: 'R-32' }), cylinder('c', 5_000, { refrigerant: 'R-32', retest: 'overdue' }),
      cylinder('d', 5_000, { heldBack: ['It is overfilled.'] }),
    ])
    expect(offer.lines.map(({ cylinderIds }) => cylinderIds)).toEqual([['a']])
    expect(offer.refusedCylinders).toBe(3)
    expect(offer.refused.map(({ text, first }) => [text, first.map(({ id }) => id)])).toEqual([
      ['The reclaimer does not take R-32.', ['b', 'c']],
      ['It is overfilled.', ['d']],
      ['The reclaimer does not take cylinders past their retest date.', ['c']],
    ])
  })

  it('names the heaviest, as many as a shipment takes', () => {
    const many = Array.from({ length: 201 }, (_, index) => cylinder(String(index).padStart(3, '0'), 1_000 + index))
    const [line] = only(many).lines
    expect(line).toMatchObject({ cylinders: 201, comesFree: 201 })
    expect(line?.cylinderIds).toHaveLength(200)
    expect(line?.cylinderIds[0]).toBe('200')
    expect(line?.cylinderIds).not.toContain('000')
  })
})

describe('what it comes to', () => {
  it('reaches the minimum at its last gram, and says what is missing below it', () => {
    expect(isReached(summed([cylinder('a', 30_000)]))).toBe(true)
    expect(summed([cylinder('a', 29_999)])).toMatchObject({ shortGrams: 1, shortCylinders: 0 })
    expect(isReached(summed([cylinder('a', 29_999)]))).toBe(false)
  })

  it('reaches both minimums where both are given', () => {
    const both = taker({ minimumCylinders: 2 })
    expect(summed([cylinder('a', 30_000)], both)).toMatchObject({ shortGrams: 0, shortCylinders: 1 })
    expect(isReached(summed([cylinder('a', 15_000), cylinder('b', 15_000)], both))).toBe(true)
  })

  it('is worth nothing to fetch where there is nothing, even without a minimum', () => {
    expect(isReached(worthSum([], { minimum: null, minimumCylinders: null, pickUpCents: 0 }))).toBe(false)
  })

  it('is the price of what is ours, less charges and the pick-up', () => {
    const charges = taker({ takesMixed: true }, [price(10_000), price(-4_000, { refrigerant: null, condition: 'mixed' })])
    expect(summed([cylinder('a', 10_000), cylinder('b', 5_000, { condition: 'mixed' })], charges)).toMatchObject({
      // 10 kg at 10.00 are 100.00; 5 kg at 4.00 are charged with 20.00; the pick-up costs 20.00.
      ourCents: 8_000, chargedCents: -2_000, comesToCents: 6_000, withoutValue: 0,
    })
  })

  it('is not known, and never nothing, where no price or no cost of a pick-up is recorded', () => {
    expect(summed([cylinder('a', 10_000)], taker({}, []))).toMatchObject({ ourCents: null, comesToCents: null, withoutValue: 1 })
    expect(summed([cylinder('a', 10_000)], taker({ pickUpCents: null }))).toMatchObject({ ourCents: 10_000, comesToCents: null })
    expect(summed([cylinder('a', 10_000)], taker({ pickUpCents: 0 }))).toMatchObject({ comesToCents: 10_000 })
    expect(summed([cylinder('a', 10_000)], taker({}, [price(0)]))).toMatchObject({ ourCents: 0, withoutValue: 0 })
  })

  it('counts what nobody has weighed for nothing, and says how many they are', () => {
    expect(summed([cylinder('a', 10_000), cylinder('b', null)])).toMatchObject({ cylinders: 2, netGrams: 10_000, ourCents: 10_000, notWeighed: 1, withoutValue: 1 })
    expect(only([cylinder('b', null)]).lines[0]).toMatchObject({ netGrams: null, valueCents: null })
    expect(summed([cylinder('a', 0)])).toMatchObject({ ourCents: 0, withoutValue: 0 })
  })

  it('leaves a customer\'s refrigerant out, and a customer\'s steel does not come free', () => {
    expect(summed([cylinder('a', 30_000), cylinder('b', 30_000, { ownerIds: ['dairy'] })])).toMatchObject({ cylinders: 1, netGrams: 30_000, ourCents: 30_000 })
    expect(summed([cylinder('a', 30_000), cylinder('b', 30_000, { isOurSteel: false })])).toMatchObject({ cylinders: 2, comesFree: 1 })
  })
})

describe('in words', () => {
  const words = (candidates: Candidate[], by = taker()) => {
    const lines = ourLines(only(candidates, by).lines)
    const { kind, sentence, reason } = worthWords(lines, worthSum(lines, by.terms), { firm: 'Halvern', place: 'North shop', unit: 'kg' })
    return { kind, sentence: sentence.replaceAll('\u00A0', ' '), reason: reason.replaceAll('\u00A0', ' ') }
  }

  it('one sentence has the number, and the reason has the sum', () => {
    expect(words([cylinder('a', 30_000)])).toEqual({
      kind: 'ok', sentence: '30.00 kg of R-22 in North shop are worth a pick-up by Halvern.',
      reason: '$300.00 at today\'s prices, less $20.00 for the pick-up: $280.00. 1 cylinder of ours comes free.',
    })
    expect(words([cylinder('a', 20_000)])).toMatchObject({ kind: 'unk', sentence: '20.00 kg of R-22 in North shop: 10.00 kg missing until Halvern fetches.' })
  })

  it('a loss is said, and what is not known is said', () => {
    expect(words([cylinder('a', 30_000)], taker({}, [price(500)]))).toMatchObject({ kind: 'att', sentence: '30.00 kg of R-22 in North shop cost a pick-up by Halvern.' })
    expect(words([cylinder('a', 30_000)], taker({}, []))).toMatchObject({
      kind: 'ok', reason: 'No price is recorded for any of it. 1 cylinder without a price or a weight counts for nothing in this. 1 cylinder of ours comes free.',
    })
    expect(words([])).toMatchObject({ kind: 'unk', sentence: 'Nothing for Halvern in North shop.' })
  })
})
