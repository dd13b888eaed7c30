import { describe, expect, it } from 'vitest'
import { twoPhase } from '~~/utils/capacity/twoPhase'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'

const R410A = CATALOGUE.refrigerants.get('R-410A')!

// R-410A at 55 C: 865.5 kg/m3 of liquid, 167.0 of vapour, 3439.1 kPa; so 8,655 g of liquid or 1,670 g of vapour fill 10 L.
function at55C(netGrams: number) {
  return twoPhase({ netGrams, volumeLitres: 10, refrigerant: R410A, tC: 55 })
}

describe('liquid and vapour in a closed cylinder', () => {
  it('share its volume by halves at the mean of their densities', () => {
    // 5,162.5 g: 5 L of liquid weigh 4,327.5 g, 5 L of vapour 835 g.
    const half = at55C(5162.5)
    expect(half.phase).toBe('two-phase')
    expect(half.liquidShare).toBeCloseTo(0.5, 12)
    expect(half.liquidGrams).toBeCloseTo(4327.5, 9)
    expect(half.vapourGrams).toBeCloseTo(835, 9)
    expect(half.pressureKPa).toBeCloseTo(3439.1, 6)
  })

  it('weigh together what is in it, to a billionth', () => {
    for (const netGrams of [1671, 3000, 5000, 8000, 8654]) {
      const { liquidGrams, vapourGrams } = at55C(netGrams)
      expect(Math.abs((liquidGrams + vapourGrams) / netGrams - 1)).toBeLessThan(1e-9)
    }
  })

  it('become liquid alone where the liquid fills it, at a pressure that is not known', () => {
    expect(at55C(8654.9).phase).toBe('two-phase')
    expect(at55C(8654.9).liquidShare).toBeLessThan(1)
    expect(at55C(8655)).toEqual({ phase: 'liquid-full', liquidShare: 1, liquidGrams: 8655, vapourGrams: 0, pressureKPa: null })
    expect(at55C(20_000)).toMatchObject({ phase: 'liquid-full', liquidShare: 1, liquidGrams: 20_000 })
  })

  it('become vapour alone where there is too little for a liquid, at a pressure that is not known', () => {
    expect(at55C(1670.1).phase).toBe('two-phase')
    expect(at55C(1670)).toEqual({ phase: 'vapour', liquidShare: 0, liquidGrams: 0, vapourGrams: 1670, pressureKPa: null })
    expect(at55C(0)).toMatchObject({ phase: 'vapour', vapourGrams: 0 })
  })

  it('are not told apart outside the table, nor for weights and volumes that there are not', () => {
    for (const tC of [-40.01, 60.01, Number.NaN]) {
      expect(() => twoPhase({ netGrams: 5000, volumeLitres: 10, refrigerant: R410A, tC })).toThrow(RangeError)
    }
    for (const [netGrams, volumeLitres] of [[-1, 10], [Number.NaN, 10], [5000, 0], [5000, -1]] as const) {
      expect(() => twoPhase({ netGrams, volumeLitres, refrigerant: R410A, tC: 25 })).toThrow(RangeError)
    }
  })
})
