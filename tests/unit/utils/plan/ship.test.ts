import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { solveHere } from '~~/tests/helpers/highs'
import { ship, type Buyer, type Offer } from '~~/utils/plan/ship'

function offer(id: string, netGrams: number, worth: Record<string, number>): Offer {
  return { id, netGrams, worthCents: new Map(Object.entries(worth)) }
}

function buyer(id: string, more: Partial<Buyer> = {}): Buyer {
  return { id, pickUpCents: 0, leastGrams: 0, leastCylinders: 0, ...more }
}

async function shipped(offers: Offer[], buyers: Buyer[]) {
  const { to, cents, mostCents } = await ship(offers, buyers, solveHere, 20)
  return { to: Object.fromEntries(to), cents, mostCents }
}

describe('what is shipped to whom', () => {
  it('goes to whoever pays most for it, and what is charged for stays', async () => {
    expect(await shipped([offer('a', 9000, { north: 500, south: 700 }), offer('b', 9000, { north: -200 })], [buyer('north'), buyer('south')]))
      .toEqual({ to: { south: ['a'] }, cents: 700, mostCents: 700 })
  })

  it('is not worth a pick-up that costs as much as it brings', async () => {
    expect(await shipped([offer('a', 9000, { north: 500 })], [buyer('north', { pickUpCents: 500 })])).toEqual({ to: {}, cents: 0, mostCents: 0 })
    expect(await shipped([offer('a', 9000, { north: 501 })], [buyer('north', { pickUpCents: 500 })])).toEqual({ to: { north: ['a'] }, cents: 1, mostCents: 1 })
  })

  it('meets a minimum to the gram, with one that is charged for where that pays', async () => {
    const offers = [offer('a', 9000, { north: 500 }), offer('b', 1000, { north: -200 })]
    expect((await shipped(offers, [buyer('north', { leastGrams: 10_000 })])).to).toEqual({ north: ['a', 'b'] })
    expect((await shipped(offers, [buyer('north', { leastGrams: 10_001 })])).to).toEqual({})
    expect((await shipped(offers, [buyer('north', { leastCylinders: 2 })])).to).toEqual({ north: ['a', 'b'] })
    expect((await shipped(offers, [buyer('north', { leastCylinders: 3 })])).to).toEqual({})
  })

  it('comes to what the best of all ways comes to', async () => {
    const cents = fc.integer({ min: -300, max: 900 })
    const offers = fc.array(fc.record({ netGrams: fc.integer({ min: 1, max: 9 }), north: fc.option(cents), south: fc.option(cents) }), { minLength: 1, maxLength: 7 })
    const buyers = fc.record({ pickUpCents: fc.integer({ min: 0, max: 900 }), leastGrams: fc.integer({ min: 0, max: 20 }), leastCylinders: fc.integer({ min: 0, max: 4 }) })
    await fc.assert(fc.asyncProperty(offers, buyers, buyers, async (all, north, south) => {
      const { cents: found } = await shipped(
        all.map((one, index) => offer(`c${index}`, one.netGrams, { ...(one.north !== null && { north: one.north }), ...(one.south !== null && { south: one.south }) })),
        [buyer('north', north), buyer('south', south)],
      )
      let best = 0
      for (let way = 0; way < 3 ** all.length; way++) {
        const goesTo = all.map((_, index) => Math.floor(way / 3 ** index) % 3)
        const sum = ([['north', 1, north], ['south', 2, south]] as const).reduce<number | null>((total, [name, digit, terms]) => {
          const mine = all.filter((_, index) => goesTo[index] === digit)
          if (total === null || mine.length === 0) return total
          if (mine.some(one => one[name] === null) || mine.length < terms.leastCylinders || mine.reduce((net, one) => net + one.netGrams, 0) < terms.leastGrams) return null
          return total + mine.reduce((worth, one) => worth + one[name]!, 0) - terms.pickUpCents
        }, 0)
        best = Math.max(best, sum ?? 0)
      }
      expect(found).toBe(best)
    }), { numRuns: 60 })
  }, 30_000)
})
