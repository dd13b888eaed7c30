import { describe, expect, it } from 'vitest'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import { DEFAULT_RETEST_SETTINGS } from '~~/utils/requalification/retestSettings'
import { readFill, readRetest, typedFill, typedRetest, type FillTyped, type RetestTyped } from '~~/utils/rules/ruleTyped'

const fill = (changes: Partial<FillTyped>) => readFill({ ...typedFill(DEFAULT_FILL_POLICY), ...changes })
const retest = (changes: Partial<RetestTyped>) => readRetest({ ...typedRetest(DEFAULT_RETEST_SETTINGS), ...changes })
const paths = ({ faults }: { faults: { path: string }[] }) => faults.map(({ path }) => path)

describe('a fill rule as it is typed', () => {
  it('begins from the one in force, in percent', () => {
    expect(typedFill({ ...DEFAULT_FILL_POLICY, shareThousandths: 775 })).toMatchObject({ share: '77.5', ceiling: '95' })
  })

  it('is read with a point or a comma, to a tenth of a percent', () => {
    expect(fill({ share: '77,5' }).draft?.value).toMatchObject({ share: 0.775, ceiling: 0.95 })
    expect(paths(fill({ share: '77.55' }))).toEqual(['value.share'])
    expect(paths(fill({ share: 'much' }))).toEqual(['value.share'])
  })

  it('is at most 80 % and at most 95 % at 131 °F', () => {
    expect(fill({ share: '80', ceiling: '95' }).faults).toEqual([])
    expect(paths(fill({ share: '80.1' }))).toEqual(['value.share'])
    expect(paths(fill({ ceiling: '95.1' }))).toEqual(['value.ceiling'])
  })

  it('keeps its ceiling no lower than its share', () => {
    expect(fill({ share: '70', ceiling: '70' }).faults).toEqual([])
    expect(paths(fill({ share: '70', ceiling: '69.9' }))).toEqual(['value.ceiling'])
  })

  it('is at least one percent', () => {
    expect(fill({ share: '1' }).faults).toEqual([])
    expect(paths(fill({ share: '0.9' }))).toEqual(['value.share'])
  })
})

describe('retest settings as they are typed', () => {
  it('are whole days, and an empty period is none', () => {
    expect(retest({ soonDays: '90' }).draft?.value).toMatchObject({ soonDays: 90, intervalMonths: null, ownerChoices: [] })
    expect(paths(retest({ soonDays: '90.5' }))).toEqual(['value.soonDays'])
    expect(paths(retest({ notSeenDays: '' }))).toEqual(['value.notSeenDays'])
  })

  it('say "missing?" no earlier than "look for it"', () => {
    expect(retest({ notSeenDays: '30', missingDays: '30' }).faults).toEqual([])
    expect(paths(retest({ notSeenDays: '31', missingDays: '30' }))).toEqual(['value.missingDays'])
  })

  it('name no period above the longest of the regulation, 12 years', () => {
    expect(retest({ intervalMonths: '144' }).faults).toEqual([])
    expect(paths(retest({ intervalMonths: '145' }))).toEqual(['value.intervalMonths'])
  })

  it('take a choice of the owner only with how it is known', () => {
    const choices = typedRetest(DEFAULT_RETEST_SETTINGS).choices
    const chosen = (reason: string) => retest({ choices: { ...choices, '180.209(e)': { on: true, reason, from: '2026-03' } } })
    expect(paths(chosen(' '))).toEqual(['choices.180.209(e).reason'])
    expect(chosen('Powder coated; only reclaimed gas').draft?.value).toMatchObject({
      ownerChoices: [{ paragraph: '180.209(e)', reason: 'Powder coated; only reclaimed gas', from: '2026-03' }],
    })
  })
})
