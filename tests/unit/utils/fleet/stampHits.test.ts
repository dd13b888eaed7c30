import { expect, it } from 'vitest'
import { stampHits } from '../../../../utils/fleet/stampHits'

const rows = [{ serial: 'K1044A' }, { serial: 'QX-7 1044' }, { serial: null }, { serial: 'qx81044' }, { serial: 'K48213' }]

it('puts the cylinders whose serial ends with the typed characters before those that have them elsewhere', () => {
  expect(stampHits(rows, '1044').map(({ serial }) => serial)).toEqual(['QX-7 1044', 'qx81044', 'K1044A'])
})

it('reads case, spaces and hyphens alike, and finds none by what is not its serial', () => {
  expect(stampHits(rows, 'qx7-1044')).toEqual([{ serial: 'QX-7 1044' }])
  expect(stampHits(rows, 'R-22')).toEqual([])
})
