import { describe, expect, it } from 'vitest'
import { CUSTOMER, did, filled, folded, kg, registered, SHIPMENT, START, type Told } from '~~/tests/helpers/custody'
import { banked, creditOf } from '~~/utils/jobs/banked'

const theirs = (gross: number) => filled('R-22', gross, { ownerOfRefrigerantId: CUSTOMER })

function bankedAfter(...stories: Told[][]) {
  const all = stories.map((story, index) => {
    const { state, movements } = folded(...story)
    return { state: { ...state, id: `c${index}` }, movements: movements.filter(({ ownerId }) => ownerId === CUSTOMER).map(({ at, grams }) => ({ cylinderId: `c${index}`, at, grams })) }
  })
  return banked(CUSTOMER, all.map(({ state }) => state), all.flatMap(({ movements }) => movements))
}

describe('refrigerant banked in a customer\'s name', () => {
  it('is what is theirs in stock, by refrigerant and condition, with the cylinders it is in and since when', () => {
    const [held] = bankedAfter([registered(), theirs(20)])
    // At 20 kg the default scale is good to 0.5 %: 100 g.
    expect(held).toEqual({
      refrigerant: 'R-22', condition: 'clean', grams: 8_000, uncertaintyGrams: 100, notKnown: 0,
      cylinders: [{ id: 'c0', labelCode: null, serial: 'A1001', grams: 8_000, uncertaintyGrams: 100, isShared: false, since: new Date(START + 3_600_000).toISOString() }],
    })
  })

  it('of several cylinders is summed, its uncertainty as the root of the squares', () => {
    const [held] = bankedAfter([registered(), theirs(20)], [registered(), theirs(20)])
    // The root of 100² + 100² is 141.4.
    expect(held).toMatchObject({ grams: 16_000, uncertaintyGrams: 142 })
    expect(held!.cylinders).toHaveLength(2)
  })

  it('in a cylinder of two owners is their share, and is marked as shared', () => {
    const [held] = bankedAfter([registered(), filled('R-22', 14), theirs(20)])
    expect(held!.cylinders[0]).toMatchObject({ grams: 6_000, isShared: true })
    // Of 100 g, 6000 of 8000 g.
    expect(held!.uncertaintyGrams).toBe(75)
  })

  it('is not known where it is not weighed, and is not 0 then', () => {
    const [held] = bankedAfter([registered(), theirs(20), did('lost', { cause: 'hose' })])
    expect(held).toMatchObject({ grams: null, uncertaintyGrams: null, notKnown: 1 })
    expect(held!.cylinders[0]).toMatchObject({ grams: null, uncertaintyGrams: null })
  })

  it('is not there once it has left or was emptied, nor what is somebody else\'s', () => {
    expect(bankedAfter([registered(), theirs(20), did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) })])).toEqual([])
    expect(bankedAfter([registered(), theirs(20), did('emptied', { grossAfter: kg(12), vacuum: { microns: 500 } })])).toEqual([])
    expect(bankedAfter([registered(), filled('R-22', 20)])).toEqual([])
  })

  it('counts since it came in anew after nothing of it was left', () => {
    const story = [registered(), theirs(20), did('emptied', { grossAfter: kg(12), vacuum: { microns: 500 } }), theirs(16)]
    expect(bankedAfter(story)[0]!.cylinders[0]!.since).toBe(new Date(START + 3 * 3_600_000).toISOString())
    expect(bankedAfter([registered(), theirs(16), theirs(20)])[0]!.cylinders[0]!.since).toBe(new Date(START + 3_600_000).toISOString())
  })
})

describe('a customer\'s part of a credit', () => {
  it('is by weight, to the nearest cent, halves away from zero, charges too', () => {
    expect(creditOf(1_000, { grams: 300, wholeGrams: 1_000 })).toBe(300)
    expect(creditOf(1_001, { grams: 1, wholeGrams: 2 })).toBe(501)
    expect(creditOf(-1_001, { grams: 1, wholeGrams: 2 })).toBe(-501)
    expect(creditOf(1_000, { grams: 5, wholeGrams: 5 })).toBe(1_000)
    expect(Object.is(creditOf(-1, { grams: 1, wholeGrams: 1_000 }), 0)).toBe(true)
    expect(creditOf(1_000, { grams: 0, wholeGrams: 0 })).toBe(0)
  })
})
