import { expect, it } from 'vitest'
import { missingOf, tallyText } from '~~/utils/batch/missing'
import { cylinderRow } from '../../../helpers/cylinderRow'

const VAN = '01900000-0000-7000-8000-0000000000a1'
const TINA = { id: 'tina', name: 'Tina' }
const expected = [
  cylinderRow({ id: 'a', labelCode: '7K3M9Q2TX', serial: 'K48213', holder: TINA }),
  cylinderRow({ id: 'b', labelCode: null, serial: 'K48214', holder: null }),
  cylinderRow({ id: 'c', labelCode: null, serial: null, holder: null, place: null }),
]

it('names what was expected and not scanned, with who or what had it last', () => {
  expect(missingOf(expected, new Set(), null)).toEqual([
    { id: 'a', name: '7K3 M9Q 2TX, SN K48213', last: 'last with Tina, Van 12' },
    { id: 'b', name: 'SN K48214', last: 'last at Van 12' },
    { id: 'c', name: 'without label and serial', last: 'nobody has recorded where' },
  ])
})

it('misses none that was scanned, or that is where it is to come to', () => {
  expect(missingOf(expected, new Set(['a']), null).map(({ id }) => id)).toEqual(['b', 'c'])
  expect(missingOf(expected, new Set(['a', 'b', 'c']), null)).toEqual([])
  expect(missingOf(expected, new Set(), VAN).map(({ id }) => id)).toEqual(['c'])
})

it('tallies the list in a line', () => {
  expect(tallyText(12, 1)).toBe('Expected 12: 11 scanned, 1 missing')
  expect(tallyText(12, 0)).toBe('Expected 12: 12 scanned')
})
