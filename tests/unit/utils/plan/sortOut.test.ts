import { describe, expect, it } from 'vitest'
import { CUSTOMER, did, filled, kg, registered, SHOP, STAMP, VAN, VIEW_CONTEXT, type Told } from '~~/tests/helpers/custody'
import { cylinderId, logOf, planCylinder } from '~~/tests/helpers/planFleet'
import { sortOut, type ConsolidationRules } from '~~/utils/plan/sortOut'

const CONTEXT = { policy: VIEW_CONTEXT.policyNow, catalogue: VIEW_CONTEXT.catalogue }
const RULES = { useEmpty: true, worseTogether: false }

/** A cylinder of 16,000 g of limit that holds so many kilograms of suspect R-22, with what happened to it since. */
function holding(netKg: number, since: Told[] = [], more: { refrigerant?: string, condition?: 'suspect' | 'burnt' | 'clean', ownerOfRefrigerantId?: string, stamp?: object, placeId?: string } = {}): Told[] {
  const { refrigerant = 'R-22', condition = 'suspect', ownerOfRefrigerantId, stamp, placeId = SHOP } = more
  return [
    registered({ stamp: { ...STAMP, ...stamp } }, { placeId }),
    filled(refrigerant, 12 + netKg, { condition, grossBefore: kg(12), ...(ownerOfRefrigerantId && { ownerOfRefrigerantId }) }), ...since,
  ]
}

function sorted(stories: Told[][], rules: Partial<ConsolidationRules> = {}, standsOn: (string | null)[] = []) {
  const cylinders = stories.map((story, index) => ({ ...planCylinder(logOf(index, story), ['R-22', 'R-410A']), standsOn: standsOn[index] ?? null }))
  const { problem, bars } = sortOut(cylinders, { ...RULES, ...rules }, CONTEXT)
  const nth = (id: string) => stories.findIndex((_, index) => cylinderId(index) === id)
  return {
    gives: problem.gives.map(({ id }) => nth(id)),
    takes: problem.takes.map(({ id, roomGrams }) => [nth(id), roomGrams]),
    lots: new Set(problem.gives.map(({ lot }) => lot)).size,
    onto: problem.onto.length,
    bar: (index: number) => bars.get(cylinderId(index))!,
  }
}

describe('the cylinders of a plan', () => {
  it('may be emptied and may take, up to the limit less what the scale may be off at the stop weight', () => {
    // Stop weight 28,000 g; half a percent of it is 140 g. 16,000 - 4,000 - 140 = 11,860.
    expect(sorted([holding(4)])).toMatchObject({ gives: [0], takes: [[0, 11_860]] })
    // 16,000 - 15,859 - 140 = 1; a gram more leaves nothing.
    expect(sorted([holding(15.859)]).takes).toEqual([[0, 1]])
    expect(sorted([holding(15.86)])).toMatchObject({ gives: [0], takes: [] })
    expect(sorted([holding(15.86)]).bar(0).takes).toBe('It has no room beyond what a scale may be off.')
  })

  it('are of one lot only with the same refrigerant, condition, owner and place', () => {
    expect(sorted([holding(4), holding(5)]).lots).toBe(1)
    expect(sorted([holding(4), holding(4, [], { refrigerant: 'R-410A' })]).lots).toBe(2)
    expect(sorted([holding(4), holding(4, [], { condition: 'clean' })]).lots).toBe(2)
    expect(sorted([holding(4), holding(4, [], { ownerOfRefrigerantId: CUSTOMER })]).lots).toBe(2)
    expect(sorted([holding(4), holding(4, [did('moved', { toPlaceId: VAN })])]).lots).toBe(2)
  })

  it('go onto something worse only where that is allowed, suspect onto burnt and nothing else', () => {
    const stories = [holding(4), holding(4, [], { condition: 'burnt' }), holding(4, [], { condition: 'clean' })]
    expect(sorted(stories).onto).toBe(0)
    expect(sorted(stories, { worseTogether: true }).onto).toBe(1)
  })

  it('give nothing and take nothing where what is in them is mixed, not named, of two owners or not weighed', () => {
    const why = (story: Told[]) => {
      const { gives, takes, bar } = sorted([story])
      expect([gives, takes]).toEqual([[], []])
      return bar(0).gives
    }
    expect(why(holding(4, [filled('R-134a', 20)]))).toMatch(/^More than one refrigerant has gone into it/)
    expect(why([registered({ contents: 'unknown', gross: kg(16) })])).toMatch(/mixed or not known/)
    expect(why(holding(4, [filled('R-22', 20, { condition: 'suspect', ownerOfRefrigerantId: CUSTOMER })]))).toMatch(/two owners/)
    expect(why(holding(4, [did('lost', { cause: 'hose' })]))).toMatch(/not known by weight/)
    expect(why(holding(4, [did('checked', { method: 'laboratory', verdict: { refrigerant: 'R-22', condition: 'clean' } })], { condition: 'burnt' }))).toMatch(/called clean, but burnt/)
  })

  it('are left where they stand on a list, are set apart, are away or have ended', () => {
    expect(sorted([holding(4)], {}, ['shipment 0004']).bar(0)).toMatchObject({ gives: 'It stands on shipment 0004.', takes: 'It stands on shipment 0004.' })
    expect(sorted([holding(4, [did('quarantined', { reason: 'an oily valve' })])]).gives).toEqual([])
    expect(sorted([holding(4, [did('missing', {})])]).gives).toEqual([])
    expect(sorted([[registered({ stamp: { ...STAMP, spec: 'DOT-39' }, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(16) })]]).bar(0).gives).toMatch(/never filled again/)
  })

  it('may be emptied but not filled past their retest or where damaged', () => {
    expect(sorted([holding(4, [], { stamp: { madeMonth: '2019-03' } })])).toMatchObject({ gives: [0], takes: [] })
    expect(sorted([holding(4, [did('inspected', { result: 'damaged', reasons: ['dent'] })])])).toMatchObject({ gives: [0], takes: [] })
  })

  it('take when empty, where that is allowed and what is at their place may go in', () => {
    const empty = [registered()]
    expect(sorted([holding(4), empty]).takes).toContainEqual([1, 15_860])
    expect(sorted([holding(4), empty], { useEmpty: false }).takes.map(([index]) => index)).toEqual([0])
    expect(sorted([holding(4), [registered({}, { placeId: VAN })]]).bar(1).takes).toBe('Nothing at its place could go into it.')
    expect(sorted([holding(4), [registered({ dedicatedTo: 'R-410A' })]]).bar(1).takes).toBe('It is kept for R-410A.')
    expect(sorted([holding(4), [registered({ ownership: 'customer', ownerId: CUSTOMER })]]).bar(1).takes).toMatch(/a customer's, and the refrigerant is not/)
  })

  it('take less when empty of what is burnt, as the limit of what is oily says', () => {
    const [[, room]] = sorted([holding(4, [], { condition: 'burnt' }), [registered()]]).takes.filter(([index]) => index === 1) as [[number, number]]
    expect(room).toBeLessThan(15_860)
  })
})
