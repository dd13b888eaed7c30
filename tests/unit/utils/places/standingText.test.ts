import { describe, expect, it } from 'vitest'
import { refrigerantsText, standingText } from '../../../../utils/places/standingText'

// 60,000 g are 132.277 lb at 453.59237 g a pound.
const sum = (cylinders: number, withoutWeight = 0, refrigerants: [string | null, number][] = []) =>
  ({ cylinders, withoutWeight, grossGrams: 60_000, refrigerants: refrigerants.map(([refrigerant, count]) => ({ refrigerant, cylinders: count })) })

describe('what stands in a place', () => {
  it('is counted and weighed, and what is not weighed is said apart', () => {
    expect(standingText(sum(3), 'lb')).toBe('3 cylinders, 132.3\u00A0lb gross')
    expect(standingText(sum(3, 1), 'lb')).toBe('3 cylinders, 132.3\u00A0lb gross and 1 not weighed')
  })

  it('has no weight where none of it is weighed, and where there is none of it', () => {
    expect(standingText({ ...sum(1, 1), grossGrams: 0 }, 'lb')).toBe('1 cylinder, not weighed')
    expect(standingText({ ...sum(0), grossGrams: 0 }, 'lb')).toBe('no cylinder')
  })

  it('names four refrigerants and counts the rest', () => {
    const four: [string | null, number][] = [['R-410A', 4], ['none', 3], [null, 2], ['R-22', 1]]
    expect(refrigerantsText(sum(10, 0, four))).toBe('R-410A 4, empty 3, unknown 2, R-22 1')
    expect(refrigerantsText(sum(11, 0, [...four, ['R-32', 1]]))).toBe('R-410A 4, empty 3, unknown 2, R-22 1, 1 more')
  })
})
