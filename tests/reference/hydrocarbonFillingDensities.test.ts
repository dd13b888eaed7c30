import { describe, expect, it } from 'vitest'
import { fillLimit } from '~~/utils/capacity/fillLimit'
import { hydrocarbonPercent } from '~~/utils/capacity/fillingDensities'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { liquidDensityAt } from '~~/utils/refrigerant/saturation'
import { catalogueOfFluid } from '~~/tests/helpers/fluids'
import { lb, stampOf } from '~~/tests/helpers/stamps'

const WATER_DENSITY_60F = 999.04
const GRAMS_PER_POUND = 453.59237

// 49 CFR 173.304a(d)(1), filling densities of liquefied petroleum gas: specific gravity at 60 F from, to, percent.
const PRINTED_BANDS: [number, number, number][] = [
  [0.271, 0.289, 26],
  [0.290, 0.306, 27],
  [0.307, 0.322, 28],
  [0.323, 0.338, 29],
  [0.339, 0.354, 30],
  [0.355, 0.371, 31],
  [0.372, 0.398, 32],
  [0.399, 0.425, 33],
  [0.426, 0.440, 34],
  [0.441, 0.452, 35],
  [0.453, 0.462, 36],
  [0.463, 0.472, 37],
  [0.473, 0.480, 38],
  [0.481, 0.488, 39],
  [0.489, 0.495, 40],
  [0.496, 0.503, 41],
  [0.504, 0.510, 42],
  [0.511, 0.519, 43],
  [0.520, 0.527, 44],
  [0.528, 0.536, 45],
  [0.537, 0.544, 46],
  [0.545, 0.552, 47],
  [0.553, 0.560, 48],
  [0.561, 0.568, 49],
  [0.569, 0.576, 50],
  [0.577, 0.584, 51],
  [0.585, 0.592, 52],
  [0.593, 0.600, 53],
  [0.601, 0.608, 54],
  [0.609, 0.617, 55],
  [0.618, 0.626, 56],
  [0.627, 0.634, 57],
]

// Of a cylinder of 100 lb of water capacity, in which a filling density in percent is a weight in pounds.
function limitGramsOfPropane(specificGravity: number): number | null | undefined {
  const { terms } = fillLimit({
    stamp: stampOf({ waterCapacity: lb(100), tareWeight: lb(60) }), refrigerant: 'R-290', condition: 'clean', burnt: false,
    policy: DEFAULT_FILL_POLICY, catalogue: catalogueOfFluid('R-290', specificGravity * WATER_DENSITY_60F),
  })
  return terms.find(term => term.rule === 'filling-density')?.limitGrams
}

describe('49 CFR 173.304a(d)(1)', () => {
  it.each(PRINTED_BANDS)('prints for a specific gravity of %d to %d %d percent', (from, to, percent) => {
    expect(hydrocarbonPercent(from)).toBe(percent)
    expect(hydrocarbonPercent(to)).toBe(percent)
  })

  it.each(PRINTED_BANDS)('lets 100 lb of water capacity take, at %d and at %d, %d lb', (from, to, percent) => {
    for (const gravity of [from, to]) {
      expect(limitGramsOfPropane(gravity)).toBe(Math.floor(percent * GRAMS_PER_POUND + 1e-6))
    }
  })

  it('goes up where the third decimal does', () => {
    for (const [index, [from, , percent]] of PRINTED_BANDS.entries()) {
      expect(hydrocarbonPercent(from - 0.0006)).toBe(PRINTED_BANDS[index - 1]?.[2] ?? null)
      expect(hydrocarbonPercent(from - 0.0004)).toBe(percent)
    }
  })

  it('has no figure lighter than 0.271 and heavier than 0.634', () => {
    for (const gravity of [0.27, 0.635]) {
      expect(hydrocarbonPercent(gravity)).toBeNull()
      expect(limitGramsOfPropane(gravity)).toBeNull()
    }
  })
})

describe('computed cross-check: the specific gravity at 60 F', () => {
  it.each([['R-290', 0.507, 42], ['R-600a', 0.563, 49], ['R-1270', 0.523, 44], ['R-600', 0.584, 51]])(
    'puts %s at a specific gravity of %d at 60 F, so at %d percent', (designation, gravity, percent) => {
      const computed = liquidDensityAt(CATALOGUE.refrigerants.get(designation)!, (60 - 32) / 1.8) / WATER_DENSITY_60F
      expect(Math.abs(computed - gravity)).toBeLessThanOrEqual(0.001)
      expect(hydrocarbonPercent(computed)).toBe(percent)
    })
})
