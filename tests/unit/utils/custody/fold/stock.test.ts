import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { CUSTOMER, did, filled, FOLD_CONTEXT, folded, HOUR, idOf, kg, recorded, registered, START, SUPPLIER, weighed, type Told } from '~~/tests/helpers/custody'
import { anyStory } from '~~/tests/helpers/custodyArbitraries'
import { fold } from '~~/utils/custody/fold'
import { heldIn } from '~~/utils/custody/fold/stock'

/** The changes of the last event of a story, as 'refrigerant grams not-known weighed found', the owner's last two digits behind where one is named. */
function lastChanges(...story: Told[]): string[] {
  return folded(...story).stockChanges.filter(({ eventId }) => eventId === idOf(story.length - 1))
    .map(({ refrigerant, ownerId, grams, notKnown, weighedVariance, foundVariance }) =>
      [refrigerant ?? '?', grams, notKnown, weighedVariance, foundVariance, ...(ownerId === null ? [] : [ownerId.slice(-2)])].join(' '))
}

// At 20 kg the default scale is good to 100 g, at 18 kg to 90 g, at 19 kg to 95 g, at 12 kg to 60 g.
describe('what an event changes in stock', () => {
  it('is the refrigerant that goes in, as surely as the scale tells it', () => {
    expect(lastChanges(registered(), filled('R-22', 20))).toEqual(['R-22 8000 0 10000 0'])
  })

  it('is nothing for an evacuated cylinder', () => {
    expect(lastChanges(registered())).toEqual([])
  })

  it('is a difference found by a weight, as unsure as both readings together', () => {
    // (100 + 90) g squared; the net now rests on 90 g, no more on 100 g.
    expect(lastChanges(registered(), filled('R-22', 20), weighed(18))).toEqual(['R-22 -2000 0 -1900 36100'])
  })

  it('is as much a difference where the weight agrees to the gram', () => {
    expect(lastChanges(registered(), filled('R-22', 20), weighed(20))).toEqual(['R-22 0 0 0 40000'])
  })

  it('is a difference before a fill, and no difference after it', () => {
    expect(lastChanges(registered(), filled('R-22', 18), filled('R-22', 20, { grossBefore: kg(18) }))).toEqual(['R-22 2000 0 1900 32400'])
    expect(lastChanges(registered(), filled('R-22', 18), filled('R-22', 20))).toEqual(['R-22 2000 0 1900 0'])
  })

  it('is no difference where the amount has a cause: what was drawn, lost, or came back with a firm', () => {
    const full = [registered(), filled('R-22', 20)]
    expect(lastChanges(...full, did('drawn', { grossAfter: kg(18), purpose: 'same-system' }))).toEqual(['R-22 -2000 0 -1900 0'])
    expect(lastChanges(...full, did('lost', { grossAfter: kg(18), cause: 'hose' }))).toEqual(['R-22 -2000 0 -1900 0'])
    expect(lastChanges(...full, did('returned', { gross: kg(18), fromFirmId: SUPPLIER }))).toEqual(['R-22 -2000 0 -1900 0'])
  })

  it('is one cylinder more that is not known, until a weight tells what is in it', () => {
    const unknown = registered({ contents: { refrigerant: 'R-22', condition: 'clean' } })
    expect(lastChanges(unknown)).toEqual(['R-22 0 1 0 0'])
    expect(lastChanges(unknown, weighed(18))).toEqual(['R-22 6000 -1 8100 0'])
    expect(lastChanges(registered({ contents: 'unknown' }))).toEqual(['? 0 1 0 0'])
  })

  it('belongs to the customer whose cylinder it is', () => {
    const customers = registered({ ownership: 'customer', ownerId: CUSTOMER, contents: 'unknown' })
    expect(lastChanges(customers)).toEqual(['? 0 1 0 0 f1'])
  })

  it('divides amounts and uncertainty between two owners by share, and counts what is not known once', () => {
    // Ours 2 kg, the customer's 6 kg; at 18 kg gross a quarter and three quarters of 6 kg.
    const two = [registered(), filled('R-22', 14), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER })]
    // Ours: 190/4 = 47.5, up to 48 g; it held 25 g of the 100 and holds 22.5, up to 23, of the 90. Theirs: 142.5, 75 and 67.5.
    expect(lastChanges(...two, weighed(18))).toEqual([`R-22 -500 0 ${23 ** 2 - 25 ** 2} ${48 ** 2}`, `R-22 -1500 0 ${68 ** 2 - 75 ** 2} ${143 ** 2} f1`])
    expect(lastChanges(...two, did('lost', { cause: 'hose' }))).toEqual(['R-22 -2000 0 -625 0', 'R-22 -6000 1 -5625 0 f1'])
  })

  it('takes a refrigerant that turns out to be another from the one name to the other', () => {
    expect(lastChanges(registered(), filled('R-22', 20), did('checked', { method: 'identifier', verdict: { refrigerant: 'R-410A', condition: 'clean' } })))
      .toEqual(['R-22 -8000 0 -10000 0', 'R-410A 8000 0 10000 0'])
  })

  it('ends when the cylinder is evacuated, whatever was not known of it', () => {
    expect(lastChanges(registered({ contents: 'unknown' }), did('emptied', { vacuum: { microns: 500 } }))).toEqual(['? 0 -1 0 0'])
  })

  it('is apart for practice', () => {
    const { stockChanges } = folded(registered(), filled('R-22', 20, {}, { practice: true }), weighed(19))
    expect(stockChanges.map(({ apart }) => apart)).toEqual([true, false])
  })

  it('counts the registration from the first event, where that was earlier', () => {
    const { movements, stockChanges } = folded(
      registered({ contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(14) }), filled('R-22', 18, {}, { occurredAt: START - HOUR }),
    )
    expect(movements.map(({ cause, grams, at }) => [cause, grams, at])).toEqual([['opening', 2000, START - HOUR], ['recovered', 4000, START - HOUR]])
    expect(stockChanges.map(({ grams, at }) => [grams, at])).toEqual([[2000, START - HOUR], [4000, START - HOUR]])
  })
})

describe('in any story', () => {
  it('movements and what the cylinder holds agree at every instant, by refrigerant and owner', () => {
    fc.assert(fc.property(anyStory, fc.integer({ min: -1, max: 8 }), (story, hour) => {
      const { movements, stockChanges } = fold(recorded(...story), FOLD_CONTEXT)
      const until = START + hour * HOUR
      expect(sums(movements.filter(({ at }) => at < until))).toEqual(sums(stockChanges.filter(({ at }) => at < until)))
    }), { numRuns: 300 })
  })

  it('the changes of stock sum to what is held at the end, and to how surely', () => {
    fc.assert(fc.property(anyStory, (story) => {
      const { state, stockChanges } = fold(recorded(...story), FOLD_CONTEXT)
      const held = heldIn(state)
      expect(sums(stockChanges)).toEqual(sums(held))
      const total = (key: 'notKnown' | 'weighedVariance', all: readonly { notKnown: number, weighedVariance: number }[]) => all.reduce((sum, one) => sum + one[key], 0)
      expect(total('notKnown', stockChanges)).toBe(total('notKnown', held))
      expect(total('weighedVariance', stockChanges)).toBe(total('weighedVariance', held))
    }), { numRuns: 300 })
  })
})

function sums(all: readonly { refrigerant: string | null, ownerId: string | null, grams: number }[]): Record<string, number> {
  const found: Record<string, number> = {}
  for (const { refrigerant, ownerId, grams } of all) found[`${refrigerant} ${ownerId}`] = (found[`${refrigerant} ${ownerId}`] ?? 0) + grams
  return Object.fromEntries(Object.entries(found).filter(([, grams]) => grams !== 0))
}
