import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bestOfEveryWay } from '~~/tests/helpers/everyWay'
import { solveHere } from '~~/tests/helpers/highs'
import { consolidate } from '~~/utils/plan/consolidate'
import { faultOf, type Give, type Take, type TransferProblem } from '~~/utils/plan/transferProblem'

/** Cylinders of one lot that each hold a net and have a room left. */
function oneLot(...cylinders: [netGrams: number, roomGrams: number][]): TransferProblem {
  const ids = cylinders.map((_, index) => String.fromCharCode(97 + index))
  return {
    gives: cylinders.flatMap(([netGrams], index): Give[] => netGrams > 0 ? [{ id: ids[index]!, netGrams, lot: 'R-22' }] : []),
    takes: cylinders.map(([netGrams, roomGrams], index): Take => ({ id: ids[index]!, roomGrams, isEmpty: netGrams === 0, lot: 'R-22' })),
    onto: [],
  }
}

async function planned(problem: TransferProblem) {
  const plan = await consolidate(problem, solveHere, 20)
  return { ...plan, transfers: plan.transfers.map(({ fromId, toId, grams }) => `${fromId}>${toId} ${grams}`).sort() }
}

describe('bringing contents together', () => {
  it('empties the one that fits into the room of another, to the last gram', async () => {
    expect((await planned(oneLot([4000, 1000], [6000, 4000]))).transfers).toEqual(['a>b 4000'])
    expect((await planned(oneLot([4001, 1000], [6000, 4000]))).transfers).toEqual([])
  })

  it('parts the contents of one over two where that is the only way to free it', async () => {
    expect(await planned(oneLot([3000, 0], [9000, 1000], [8000, 2000]))).toEqual({
      transfers: ['a>b 1000', 'a>c 2000'], freed: 1, mostFreed: 1, fewestTransfers: 2,
    })
  })

  it('moves each whole where it can, and of two as good the lighter one', async () => {
    expect(await planned(oneLot([3000, 0], [2000, 0], [9000, 3500]))).toEqual({ transfers: ['b>c 2000'], freed: 1, mostFreed: 1, fewestTransfers: 1 })
  })

  it('counts an empty one that is used, so that one for one is no gain', async () => {
    expect((await planned(oneLot([3000, 0], [0, 16_000]))).transfers).toEqual([])
    expect(await planned(oneLot([3000, 0], [4000, 0], [0, 16_000]))).toMatchObject({ transfers: ['a>c 3000', 'b>c 4000'], freed: 1 })
  })

  it('leaves apart what may not be brought together, and brings onto another lot only what may go there', async () => {
    const apart: TransferProblem = {
      gives: [{ id: 'a', netGrams: 1000, lot: 'suspect' }, { id: 'b', netGrams: 1000, lot: 'burnt' }],
      takes: [{ id: 'a', roomGrams: 9000, isEmpty: false, lot: 'suspect' }, { id: 'b', roomGrams: 9000, isEmpty: false, lot: 'burnt' }],
      onto: [],
    }
    expect((await planned(apart)).transfers).toEqual([])
    expect((await planned({ ...apart, onto: [{ from: 'suspect', to: 'burnt' }] })).transfers).toEqual(['a>b 1000'])
  })

  it('uses an empty cylinder for one lot only', async () => {
    const gives = ['a', 'b', 'c'].map((id): Give => ({ id, netGrams: 1000, lot: id === 'c' ? 'R-410A' : 'R-22' }))
    const takes = ['R-22', 'R-410A'].map((lot): Take => ({ id: 'e', roomGrams: 9000, isEmpty: true, lot }))
    expect((await planned({ gives, takes, onto: [] })).transfers).toEqual(['a>e 1000', 'b>e 1000'])
  })
})

// Few different figures, so that sums often meet exactly and parting is needed.
const grams = fc.oneof(fc.integer({ min: 1, max: 12 }).map(steps => steps * 500), fc.integer({ min: 1, max: 6000 }))
const lot = fc.constantFrom('suspect', 'suspect', 'burnt', 'clean')
const cylinder = fc.record({ lot, netGrams: grams, roomGrams: fc.oneof(fc.constant(0), grams), kind: fc.constantFrom('both', 'both', 'both', 'gives', 'takes', 'empty'), serves: fc.uniqueArray(lot, { minLength: 1, maxLength: 2 }) })

const problems = fc.record({ cylinders: fc.array(cylinder, { minLength: 2, maxLength: 12, size: 'max' }), isOneLot: fc.boolean(), mayGoOnto: fc.boolean() })
  .map(({ cylinders, isOneLot, mayGoOnto }): TransferProblem => {
    const kinds = cylinders.map(({ kind }, index) => kind === 'empty' && cylinders.slice(0, index).filter(one => one.kind === 'empty').length > 1 ? 'both' : kind)
    const all = cylinders.map((one, index) => ({ ...one, kind: kinds[index]!, id: `c${index}`, lot: isOneLot ? 'suspect' : one.lot, serves: isOneLot ? ['suspect'] : one.serves }))
    return {
      gives: all.filter(({ kind }) => kind === 'both' || kind === 'gives'),
      takes: all.flatMap(({ id, roomGrams, lot: own, kind, serves }): Take[] => {
        if (kind === 'empty') return serves.map(served => ({ id, roomGrams: roomGrams * 2, isEmpty: true, lot: served }))
        return kind === 'gives' ? [] : [{ id, roomGrams, isEmpty: false, lot: own }]
      }),
      onto: mayGoOnto ? [{ from: 'suspect', to: 'burnt' }] : [],
    }
  })

describe('the plan is the best there is', () => {
  it('as trying every way shows, on 200 fleets of up to a dozen cylinders', async () => {
    let parted = 0
    await fc.assert(fc.asyncProperty(problems, async (problem) => {
      const plan = await consolidate(problem, solveHere, 100)
      const best = bestOfEveryWay(problem)
      expect(faultOf(problem, plan.transfers)).toBeNull()
      expect({ freed: plan.freed, transfers: plan.transfers.length }).toEqual(best)
      expect({ freed: plan.mostFreed, transfers: plan.fewestTransfers }).toEqual(best)
      if (new Set(plan.transfers.map(({ fromId }) => fromId)).size < plan.transfers.length) parted++
    }), { numRuns: 200 })
    expect(parted).toBeGreaterThan(5)
  }, 120_000)
})
