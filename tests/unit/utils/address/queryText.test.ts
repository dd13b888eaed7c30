import { expect, it } from 'vitest'
import { queryList, queryText, withoutEmpty } from '../../../../utils/address/queryText'

it('reads what an address holds once, and nothing of what it holds twice, without a value or not at all', () => {
  expect(queryText({ van: 'Van 2' }, 'van')).toBe('Van 2')
  expect(queryText({ van: ['Van 2', 'Van 3'] }, 'van')).toBe('')
  expect(queryText({ van: null }, 'van')).toBe('')
  expect(queryText({}, 'van')).toBe('')
})

it('reads a list without its gaps and spaces', () => {
  expect(queryList({ with: 'K1044, QX7,,' }, 'with')).toEqual(['K1044', 'QX7'])
  expect(queryList({}, 'with')).toEqual([])
})

it('keeps a zero in an address, and leaves out what is empty', () => {
  expect(withoutEmpty({ gross: '0kg', share: '' })).toEqual({ gross: '0kg' })
})
