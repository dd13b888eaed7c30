import { describe, expect, it } from 'vitest'
import type { FillTerm } from '~~/utils/capacity/types'
import { hotSentence, liquidFullWords, volumeShare } from '~~/utils/picture/heatWords'

const CEILING: FillTerm = { rule: 'hot-ceiling', limitGrams: 17_800, standing: 'in-force', factors: [], source: '' }

function ofShare(hotLiquidShare: number | null, terms: FillTerm[] = [CEILING]) {
  return { forRefrigerant: 'R-22', hotLiquidShare, terms }
}

describe('a share of the volume in words', () => {
  it.each([
    [0.915, '92\u00A0%'], [0.9149, '91\u00A0%'],
    [1, '100\u00A0%'], [0.9999, '99\u00A0%'],
    [0, '0\u00A0%'], [0.0001, '1\u00A0%'],
  ])('%d is %s: full only without vapor, empty only without liquid', (share, words) => {
    expect(volumeShare(share)).toBe(words)
  })
})

describe('how full a cylinder is at 131 F', () => {
  it('is said of what is in it', () => {
    expect(hotSentence(ofShare(0.92), false)).toBe('At 131 °F it is 92\u00A0% full')
  })

  it('is said of a fill to the limit where nothing is in it', () => {
    expect(hotSentence(ofShare(0.92), true)).toBe('Filled to the limit, at 131 °F it is 92\u00A0% full')
  })

  it('names both ends by their names', () => {
    expect(hotSentence(ofShare(1), false)).toContain('liquid-full')
    expect(hotSentence(ofShare(0), false)).toContain('all vapor')
  })

  it('is not said where it is not known', () => {
    expect(hotSentence(ofShare(null), false)).toBeNull()
    expect(hotSentence({ ...ofShare(0.5), forRefrigerant: null }, false)).toBeNull()
  })

  it('is a matter of pressure for a gas, but not where a figure is merely kept back as unsafe', () => {
    expect(hotSentence(ofShare(null, [{ ...CEILING, limitGrams: null }]), false)).toContain('all gas')
    expect(hotSentence(ofShare(null, [{ ...CEILING, limitGrams: null, standing: 'unsafe' }]), false)).toBeNull()
  })
})

describe('the liquid-full temperature in words', () => {
  it('is rounded down: 61.9 C is 143.42 F', () => {
    expect(liquidFullWords({ c: 61.9 })).toBe('143\u00A0°F')
  })

  it('is above the last one known, or never', () => {
    expect(liquidFullWords({ aboveC: 60 })).toBe('above\u00A0140\u00A0°F')
    expect(liquidFullWords({ never: true })).toContain('never')
  })
})
