import { describe, expect, it } from 'vitest'
import type { Scale } from '~~/utils/quantity/scale'
import { scaleAccuracyGrams, stepGrams } from '~~/utils/quantity/scale'

describe('how far a scale may be off', () => {
  it('is half an ounce where that is more than half a percent', () => {
    // 0.5 oz = 14.17 g, rounded up; half a percent of 2,000 g is 10 g.
    expect(scaleAccuracyGrams(2000)).toBe(15)
    expect(scaleAccuracyGrams(0)).toBe(15)
  })

  it('is half a percent of a heavier reading', () => {
    expect(scaleAccuracyGrams(3000)).toBe(15)
    expect(scaleAccuracyGrams(3001)).toBe(16)
    expect(scaleAccuracyGrams(29_960)).toBe(150)
  })

  it('is the larger of a scale\'s own grams and percent', () => {
    const scale: Scale = { id: 's', name: 'Shop floor', accuracyGrams: 20, accuracyPercent: 0.1, lastCheck: null }
    expect(scaleAccuracyGrams(10_000, scale)).toBe(20)
    expect(scaleAccuracyGrams(30_000, scale)).toBe(30)
  })

  it('is none for a scale that is taken as exact', () => {
    expect(scaleAccuracyGrams(10_000, { id: 's', name: 'Bench', accuracyGrams: 0, accuracyPercent: 0, lastCheck: null })).toBe(0)
  })
})

describe('the weight a scale is good to', () => {
  it.each<[Parameters<typeof stepGrams>[0], number]>([
    // 28.3495 g to the ounce, 453.59237 g to the pound.
    [{ unit: 'oz', value: 0.5 }, 15],
    [{ unit: 'oz', value: 1 }, 29],
    [{ unit: 'lb', value: 0.1 }, 46],
    [{ unit: 'g', value: 5 }, 5],
    [{ unit: 'g', value: 5.1 }, 6],
    [{ unit: 'kg', value: 0.02 }, 20],
    [{ unit: 'kg', value: 0 }, 0],
  ])('is kept rounded up: %o is %i g', (step, grams) => {
    expect(stepGrams(step)).toBe(grams)
  })
})
