import { describe, expect, it } from 'vitest'
import { did, filled, folded, kg, registered, REQUALIFIER, STAMP, VIEW_CONTEXT, type Told } from '~~/tests/helpers/custody'
import { DEFAULT_FILL_POLICY, type FillPolicy } from '~~/utils/capacity/types'
import { cacheRow, rowToday } from '~~/utils/custody/row'
import { newRulePreview } from '~~/utils/rules/rulePreview'

const AT = VIEW_CONTEXT.nowMs

/** What the preview says of cylinders with these stories, where the rule in force is the usual one. */
function previewOf(stories: Told[][], then: { policy?: FillPolicy, soonDays?: number, intervalMonths?: number }) {
  const sum = newRulePreview(AT)
  for (const story of stories) {
    const { state } = folded(...story)
    const rowBy = (context: typeof VIEW_CONTEXT) => rowToday({ id: state.id, ...cacheRow(state, context) }, context)
    sum.take(rowBy(VIEW_CONTEXT), rowBy({
      ...VIEW_CONTEXT,
      policyNow: then.policy ?? DEFAULT_FILL_POLICY,
      retest: { ...VIEW_CONTEXT.retest, ...(then.soonDays && { soonDays: then.soonDays }), ...(then.intervalMonths && { intervalMonths: then.intervalMonths }) },
    }))
  }
  return sum.answer()
}

// Water capacity 20 kg: R-22 at most 16,000 g by 0.80, 14,000 g by 0.70. Tare 12 kg.
const AT_70: FillPolicy = { ...DEFAULT_FILL_POLICY, shareThousandths: 700 }

describe('what a fill rule would change', () => {
  it('counts the cylinders with a lower limit, with the limit before and after', () => {
    const { cylinders, lowerLimit, higherLimit } = previewOf([[registered(), filled('R-22', 20)], [registered()]], { policy: AT_70 })
    expect(cylinders).toBe(2)
    expect(lowerLimit).toMatchObject({ count: 1, examples: [{ refrigerant: 'R-22', before: { fillLimitGrams: 16_000 }, after: { fillLimitGrams: 14_000, netGrams: 8000 } }] })
    expect(higherLimit.count).toBe(0)
  })

  it('sums the room by refrigerant, and takes none for what is overfilled then', () => {
    const { room } = previewOf([[registered(), filled('R-22', 20)], [registered(), filled('R-22', 27)], [registered(), filled('R-134a', 20)]], { policy: AT_70 })
    // 8 + 1 kg of room for R-22; then 6 kg, and the second holds 15 kg over 14 kg.
    expect(room.find(({ refrigerant }) => refrigerant === 'R-22')).toEqual({ refrigerant: 'R-22', cylinders: 2, beforeGrams: 9000, afterGrams: 6000 })
    expect(room.map(({ refrigerant }) => refrigerant)).toEqual(['R-134a', 'R-22'])
  })

  it('leaves what was filled by a more generous rule not overfilled, but never above the new ceiling', () => {
    const full = [registered(), filled('R-22', 28)]
    expect(previewOf([full], { policy: AT_70 }).overfilled.count).toBe(0)
    // 0.70 of the liquid at 131 °F, 1.067 kg/L in 20.02 L, is 14.9 kg: below the 16 kg in it.
    expect(previewOf([full], { policy: { ...AT_70, ceilingThousandths: 700 } }).overfilled).toMatchObject({ count: 1, examples: [{ after: { netGrams: 16_000 } }] })
  })

  it('names ten of many, those first that lose most', () => {
    const stories = Array.from({ length: 12 }, (_, index) => [registered({ stamp: { ...STAMP, serial: `S${index}`, waterCapacity: kg(20 + index) } }), filled('R-22', 14)])
    const { lowerLimit } = previewOf(stories, { policy: AT_70 })
    expect(lowerLimit.count).toBe(12)
    expect(lowerLimit.examples.map(({ serial }) => serial)).toEqual(['S11', 'S10', 'S9', 'S8', 'S7', 'S6', 'S5', 'S4', 'S3', 'S2'])
  })

  it('leaves condemned cylinders out', () => {
    const condemned = [registered(), did('retested', { result: 'condemned', month: '2026-07', method: 'volumetric', requalifierId: REQUALIFIER })]
    expect(previewOf([condemned], { policy: AT_70 }).cylinders).toBe(0)
  })
})

describe('what retest settings would change', () => {
  it('counts how many are overdue, due soon and in date, before and then', () => {
    // Made in March 2024, so due in March 2029: 33 months off. A period of 24 months would have ended in March 2026.
    const { retest, overdue, inDateAgain } = previewOf([[registered()]], { intervalMonths: 24 })
    expect(retest).toMatchObject({ inDate: { before: 1, after: 0 }, overdue: { before: 0, after: 1 } })
    expect(overdue).toMatchObject({ count: 1, examples: [{ before: { dueMonth: '2029-03' }, after: { dueMonth: '2026-03' } }] })
    expect(inDateAgain.count).toBe(0)
  })

  it('counts who is reminded earlier', () => {
    const stamp = { ...STAMP, madeMonth: '2021-12' }
    // Due December 2026: 182 days after 2 July.
    expect(previewOf([[registered({ stamp })]], { soonDays: 181 }).retest).toMatchObject({ soon: { before: 0, after: 0 } })
    expect(previewOf([[registered({ stamp })]], { soonDays: 182 }).retest).toMatchObject({ inDate: { before: 1, after: 0 }, soon: { before: 0, after: 1 } })
  })

  it('keeps those without a date, and those that need none, apart', () => {
    const of = (stamp: object) => [registered({ stamp: { ...STAMP, ...stamp } })]
    expect(previewOf([of({ madeMonth: null }), of({ spec: 'DOT-39' })], {}).retest).toMatchObject({ unknown: { before: 1, after: 1 }, notRequired: { before: 1, after: 1 }, inDate: { before: 0 } })
  })
})
