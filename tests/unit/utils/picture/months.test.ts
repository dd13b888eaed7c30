import { expect, it } from 'vitest'
import { layOutMonths } from '../../../../utils/picture/months'

it('shows twelve months from this one on, over the turn of the year', () => {
  const cells = layOutMonths('2026-12', { '2027-03': 2 }, 4)
  expect(cells.map(cell => cell.short)).toEqual(['Dec', 'Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov'])
  expect(cells[3]).toEqual({ month: '2027-03', short: 'Mar', long: 'March 2027', count: 2, soon: true })
  expect(cells[11]).toMatchObject({ long: 'November 2027', count: 0 })
})

it('warns up to the last month of the warning time and not beyond', () => {
  expect(layOutMonths('2026-12', {}, 4).map(cell => cell.soon).slice(2, 5)).toEqual([true, true, false])
})
