import { expect, it } from 'vitest'
import { typedLines } from '../../../../utils/now/typedLines'
import { whatWaits } from '../../../../utils/now/whatWaits'

const ID = '01900000-0000-7000-8000-000000000001'

it('leads back to each form that was typed and not recorded', () => {
  expect(typedLines([`${ID} recovery`, `${ID} weighed`, 'registration', `settlement ${ID}`, `return ${ID}`, `batch load ${ID}`, 'batch receive '].sort()).map(({ to }) => to)).toEqual([
    `/c/${ID}/recover`, `/c/${ID}/act/weighed`, '/batch?act=load&van=' + ID, '/batch?act=receive', '/fleet/register', `/retests/${ID}`, `/shipments/${ID}/settlement`,
  ])
})

it('passes over what is no form', () => {
  expect(typedLines(['label-printing', `${ID} danced`, 'K48213 weighed', `settlement 7`])).toEqual([])
})

it('says how many things wait, and whether the first can hurt', () => {
  expect(whatWaits([])).toBe('Nothing needs you now.')
  expect(whatWaits([{ kind: 'stop' }])).toBe('1 thing')
  expect(whatWaits([{ kind: 'stop' }, { kind: 'att' }])).toBe('2 things, the most dangerous first')
  expect(whatWaits([{ kind: 'unk' }, { kind: 'att' }])).toBe('2 things, the most urgent first')
})
