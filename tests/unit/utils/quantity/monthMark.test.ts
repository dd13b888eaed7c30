import { describe, expect, it } from 'vitest'
import { readMonthMark } from '../../../../utils/quantity/monthMark'

describe('a month as it is struck on a collar', () => {
  it.each([
    ['03-21', '2021-03'],
    ['3 21', '2021-03'],
    ['04/2026', '2026-04'],
    ['2021-03', '2021-03'],
    ['12.98', '1998-12'],
  ])('reads %s as %s', (typed, month) => {
    expect(readMonthMark(typed, '2026-12')).toBe(month)
  })

  it('takes two digits up to five years ahead for a slip, and six for the century before', () => {
    expect(readMonthMark('01-31', '2026-12')).toBe('2031-01')
    expect(readMonthMark('01-32', '2026-12')).toBe('1932-01')
  })

  it.each(['', '13-21', '00-21', 'March 21', '0321', '3-1'])('does not guess at “%s”', (typed) => {
    expect(readMonthMark(typed, '2026-12')).toBeNull()
  })
})
