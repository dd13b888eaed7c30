import { expect, it } from 'vitest'
import { placeTree } from '../../../../utils/places/placeTree'

const place = (id: string, parentId: string | null = null) => ({ id, parentId })
const shape = (places: { id: string, parentId: string | null }[]) => placeTree(places).map(row => `${row.depth} ${row.place.id}`)

it('shows racks under the shop they stand in', () => {
  expect(shape([place('bay 1', 'shop'), place('shop'), place('van'), place('shelf', 'bay 1')])).toEqual(['0 shop', '1 bay 1', '2 shelf', '0 van'])
})

it('loses no place whose shop is not shown, nor one that stands in itself', () => {
  expect(shape([place('bay', 'gone'), place('a', 'b'), place('b', 'a')])).toEqual(['0 bay', '0 a', '1 b'])
})
