import { expect, it } from 'vitest'
import { stickyOffsets } from '../../../../utils/picture/table'

it('sets each kept column beside those kept before it', () => {
  const columns = [{ key: 'a', label: 'A', stick: '9rem' }, { key: 'b', label: 'B' }, { key: 'c', label: 'C', stick: '5rem' }]
  expect(stickyOffsets(columns, '44px')).toEqual(['calc(44px)', null, 'calc(44px + 9rem)'])
})
