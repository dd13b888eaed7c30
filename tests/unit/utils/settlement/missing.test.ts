import { expect, it } from 'vitest'
import { NOTHING_SAID } from '../../../../utils/settlement/figures'
import { stillMissing } from '../../../../utils/settlement/missing'
import { prefilled } from '../../../../utils/settlement/prefilled'

it('a settlement lacks what became of a line, and of one taken over its net and price', () => {
  const lines = [
    { cylinderId: 'a', sent: null, figures: NOTHING_SAID },
    { cylinderId: 'b', sent: null, figures: { ...NOTHING_SAID, outcome: 'taken-over' as const, acceptedNet: { unit: 'lb' as const, value: 0 } } },
    { cylinderId: 'c', sent: null, figures: { ...NOTHING_SAID, outcome: 'sent-back' as const } },
  ]
  expect(stillMissing({ lines, statement: { number: 'S1', day: null, others: [], totalCents: 0 }, unexpected: [] }))
    .toEqual({ outcome: ['a'], acceptedNet: [], rate: ['b'], statement: ['day'] })
})

it('a line begins with what the dock said and the price of the day; the dock having it there is not yet a take-over', () => {
  const dock = { theirGross: { unit: 'lb' as const, value: 40 }, missing: false, grade: null, acceptedNet: null, sentBack: null }
  const rate = { mills: 2_400, per: 'lb' as const }
  expect(prefilled(dock, rate)).toEqual({ theirGross: { unit: 'lb', value: 40 }, acceptedNet: null, grade: null, rate, statedCents: null, outcome: null })
  expect(prefilled({ ...dock, acceptedNet: { unit: 'lb', value: 12 } }, rate).outcome).toBe('taken-over')
  expect(prefilled({ ...dock, missing: true }, rate).outcome).toBe('not-arrived')
  expect(prefilled({ ...dock, sentBack: { because: null } }, rate).outcome).toBe('sent-back')
  expect(prefilled(undefined, null)).toEqual(NOTHING_SAID)
})
