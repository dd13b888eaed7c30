import { describe, expect, it } from 'vitest'
import { compositionInWords, formatGwp, kindInWords, mixtureName, safetyForCylinder } from '~~/utils/refrigerant/words'

describe('a refrigerant in words', () => {
  it.each([[2087.5, '2,088'], [465.391, '465'], [10, '10'], [9.9994, '9.999'], [0.501, '0.501'], [0, '0']])('a GWP of %d is written %s', (value, text) => {
    expect(formatGwp(value)).toBe(text)
  })

  it('names its kind, and keeps a kind it does not know', () => {
    expect(kindInWords('azeotrope')).toBe('blend, boils as one')
    expect(kindInWords('solution')).toBe('solution')
  })

  it('lists what it is made of', () => {
    expect(compositionInWords([{ component: 'R-32', massPercent: 68.9 }, { component: 'R-1234yf', massPercent: 31.1 }])).toBe('R-32\u00A068.9\u00A0%, R-1234yf\u00A031.1\u00A0%')
  })

  it('names a mixture without a number by its components and their shares', () => {
    expect(mixtureName([{ component: 'R-32', massPercent: 50 }, { component: 'R-125', massPercent: 50 }])).toBe('R-32/R-125 (50/50)')
    expect(mixtureName([{ component: 'R-32', massPercent: 68.9 }, { component: 'R-1234yf', massPercent: 31.1 }])).toBe('R-32/R-1234yf (68.9/31.1)')
  })

  it('says what its class means for a cylinder', () => {
    expect(safetyForCylinder({ safetyClass: 'A1', flammable: false, toxic: false })).toEqual(['Does not burn in air, by its class.'])
    expect(safetyForCylinder({ safetyClass: 'A2L', flammable: true, toxic: false })[0]).toContain('marked for flammables')
    expect(safetyForCylinder({ safetyClass: 'B1', flammable: false, toxic: true })[1]).toContain('DOT-39')
    expect(safetyForCylinder({ safetyClass: null, flammable: true, toxic: true })).toHaveLength(3)
  })
})
