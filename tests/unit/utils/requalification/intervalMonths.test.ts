import { describe, expect, it } from 'vitest'
import { intervalMonths } from '~~/utils/requalification/intervalMonths'

describe('the test period of a specification', () => {
  // 49 CFR 180.209 Table 1, the shortest period of each row.
  it.each([
    ['DOT-3A', 60], ['DOT-3AA', 60], ['DOT-3AL', 60], ['DOT-3AX', 60], ['DOT-3AAX', 60], ['DOT-3B', 60], ['DOT-3BN', 60],
    ['DOT-3HT', 36], ['DOT-3T', 60], ['DOT-4AA480', 60], ['DOT-4B', 60], ['DOT-4BA', 60], ['DOT-4BW', 60],
    ['DOT-4B240ET', 60], ['DOT-4D', 60], ['DOT-4DA', 60], ['DOT-4DS', 60], ['DOT-4E', 60], ['DOT-8', 120], ['DOT-8AL', 120],
  ])('%s: %d months', (spec, months) => {
    expect(intervalMonths(spec)).toBe(months)
  })

  it.each(['DOT-3E', 'DOT-4L', 'DOT-39'])('%s is never tested, whatever the owner sets', (spec) => {
    expect(intervalMonths(spec)).toBeNull()
    expect(intervalMonths(spec, 60)).toBeNull()
  })

  it('is not known for a special permit without the owner\'s setting, nor for a specification outside the list', () => {
    expect(intervalMonths('DOT-SP')).toBeNull()
    expect(intervalMonths('DOT-SP', 84)).toBe(84)
    expect(intervalMonths('DOT-5A', 60)).toBeNull()
  })

  it('is the owner\'s, up to the longest that the regulation allows', () => {
    expect(intervalMonths('DOT-4BA', 144)).toBe(144)
    expect(intervalMonths('DOT-4BA', 145)).toBe(144)
    expect(intervalMonths('DOT-4BA', 36)).toBe(36)
    expect(intervalMonths('DOT-3HT', 60)).toBe(36)
    expect(intervalMonths('DOT-4BA', null)).toBe(60)
    expect(intervalMonths('DOT-4BA', 0)).toBe(60)
  })
})
