import { describe, expect, it } from 'vitest'
import { corrected, did, filled, idOf, kg, LOT, registered, REQUALIFIER, SHIPMENT, STAMP, viewAfter, weighed, type Told } from '~~/tests/helpers/custody'
import { mayDraw, mayFill, mayShip, mayTake, mayTest, type PlanAnswer } from '~~/utils/custody/plan'

const labelled = did('labelled', { code: '7K3M9Q2TX' })
const start = [registered(), labelled]
const full = [...start, filled('R-22', 20)]
const overfilled = [...start, filled('R-22', 29)]
const condemned = did('retested', { month: '2026-07', method: 'visual', result: 'condemned', requalifierId: REQUALIFIER })
const atReclaim = [...full, did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) })]
const overdue = { ...STAMP, madeMonth: '2019-03' }

function plan(judge: (view: ReturnType<typeof viewAfter>) => PlanAnswer, story: Told[], askedRefrigerant?: string): string[] | true {
  const { allowed, because, missing } = judge(viewAfter(story, askedRefrigerant === undefined ? {} : { askedRefrigerant }))
  return allowed || [...because.map(({ code }) => code), ...missing]
}

describe('a cylinder may be filled', () => {
  it('while nothing speaks against it and there is room, weighed or not', () => {
    expect(plan(mayFill, full)).toBe(true)
    expect(plan(mayFill, start, 'R-22')).toBe(true)
    expect(plan(mayFill, [...full, did('lost', { cause: 'hose' })])).toBe(true)
    expect(plan(mayFill, start)).toEqual(['refrigerant'])
  })

  it('up to its limit, not beyond', () => {
    expect(plan(mayFill, [...start, filled('R-22', 27.999)])).toBe(true)
    expect(plan(mayFill, [...start, filled('R-22', 28)])).toEqual(['nearly-full'])
    expect(plan(mayFill, overfilled)).toEqual(['overfill'])
  })

  it('not overdue, not away, not mixed, not after its end', () => {
    expect(plan(mayFill, [registered({ stamp: overdue })], 'R-22')).toEqual(['retest-overdue'])
    expect(plan(mayFill, atReclaim)).toEqual(['away'])
    expect(plan(mayFill, [...full, filled('R-134a', 21)])).toEqual(['second-refrigerant', 'refrigerant'])
    expect(plan(mayFill, [...full, condemned])).toEqual(['after-end'])
  })

  it('not where no rule has a figure, though nothing else speaks against it', () => {
    // R-428A has no filling ratio by the UN rule: its table ends at 55 C, below the 60 C that the ratio asks for.
    const unRatio = { shareThousandths: 800, ceilingThousandths: 950, options: { liquid130F: false, unRatio: true } }
    const shown = viewAfter(start, { askedRefrigerant: 'R-428A', policyNow: unRatio })
    expect(shown.capacity).toMatchObject({ fillLimitGrams: null, stopWeightGrams: null, refusals: [], missing: [] })
    expect(mayFill(shown)).toEqual({ allowed: false, because: [], missing: [] })
    expect(shown.mayNot).toContainEqual({ kind: 'filled', because: 'No rule has a figure for this refrigerant in this cylinder.' })
  })
})

describe('a cylinder may be taken along', () => {
  it('overdue or with contents, but not overfilled, away or condemned', () => {
    expect(plan(mayTake, full)).toBe(true)
    expect(plan(mayTake, [registered({ stamp: overdue })])).toBe(true)
    expect(plan(mayTake, overfilled)).toEqual(['overfill'])
    expect(plan(mayTake, atReclaim)).toEqual(['away'])
    expect(plan(mayTake, [...full, condemned])).toEqual(['condemned'])
  })
})

describe('refrigerant may be drawn', () => {
  it('from an overfilled and even from a condemned cylinder, but not from one that is away', () => {
    expect(plan(mayDraw, overfilled)).toBe(true)
    expect(plan(mayDraw, [...full, condemned])).toBe(true)
    expect(plan(mayDraw, atReclaim)).toEqual(['away'])
  })
})

describe('a cylinder may be shipped', () => {
  it('mixed or overdue, for the papers say so', () => {
    expect(plan(mayShip, full)).toBe(true)
    expect(plan(mayShip, [...full, filled('R-134a', 21)])).toBe(true)
    expect(plan(mayShip, [registered({ stamp: overdue, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) }), labelled])).toBe(true)
  })

  it('not unlabelled, overfilled, condemned, non-refillable, unregistered or already gone', () => {
    expect(plan(mayShip, [registered(), filled('R-22', 20)])).toEqual(['not-shippable'])
    expect(plan(mayShip, overfilled)).toEqual(['overfill'])
    expect(plan(mayShip, [...full, condemned])).toEqual(['condemned'])
    expect(plan(mayShip, [registered({ stamp: { ...STAMP, spec: 'DOT-39' } }), labelled])).toEqual(['not-shippable'])
    expect(plan(mayShip, [labelled])).toEqual(['not-registered'])
    expect(plan(mayShip, atReclaim)).toEqual(['away'])
  })

  it('not on a label that was a mistake', () => {
    expect(plan(mayShip, [...full, corrected(idOf(1))])).toEqual(['not-shippable'])
  })
})

describe('a cylinder may be tested', () => {
  it('with nothing in it, or no more than the scale can tell from nothing', () => {
    expect(plan(mayTest, [registered({ stamp: overdue })])).toBe(true)
    expect(plan(mayTest, [...full, weighed(12.06)])).toBe(true)
    expect(plan(mayTest, [...full, weighed(12.062)])).toEqual(['tested-full'])
  })

  it('never with contents, overdue or not, nor where nobody knows', () => {
    expect(plan(mayTest, full)).toEqual(['tested-full'])
    expect(plan(mayTest, [registered({ stamp: overdue, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) })])).toEqual(['retest-overdue', 'tested-full'])
    expect(plan(mayTest, [registered({ contents: 'unknown' })])).toEqual(['tested-full'])
  })

  it('not twice at once, and not after its end', () => {
    expect(plan(mayTest, [registered(), did('sent-for-test', { lotId: LOT })])).toEqual(['away'])
    expect(plan(mayTest, [registered(), condemned])).toEqual(['condemned'])
  })
})
