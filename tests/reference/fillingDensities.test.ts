import { describe, expect, it } from 'vitest'
import { fillingDensityRows, hydrocarbonPercent, isLiquefiedGasSpec, rowFit } from '~~/utils/capacity/fillingDensities'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { liquidDensityAt } from '~~/utils/refrigerant/saturation'
import { splitSpec } from '~~/utils/requalification/specs'

// 49 CFR 173.304a(a)(2), table of maximum permitted filling densities: refrigerant, percent of the weight of water at 60 F
// (null: not liquid-full at 131 F), least marks.
const PRINTED: [string, number | null, string][] = [
  ['R-717', 54, '3A480, 3AA480, 3A480X, 4AA480, 3, 3E1800, 3AL480'],
  ['R-13B1', 124, '3A400, 3AA400, 3B400, 4AA480, 4B400, 4BA400, 4BW400, 3E1800, 39, 3AL400'],
  ['R-744', 68, '3A1800, 3AX1800, 3AA1800, 3AAX1800, 3, 3E1800, 3T1800, 3HT2000, 39, 3AL1800'],
  ['R-744', 70.3, '3A2000, 3AA2000, 3AX2000, 3AAX2000, 3T2000'],
  ['R-744', 73.2, '3A2265, 3AA2265, 3AX2265, 3AAX2265, 3T2265'],
  ['R-744', 74.5, '3A2400, 3AA2400, 3AX2400, 3AAX2400, 3T2400'],
  ['R-142b', 100, '3A150, 3AA150, 3B150, 4B150, 4BA225, 4BW225, 3E1800, 39, 3AL150'],
  ['R-22', 105, '3A240, 3AA240, 3B240, 4B240, 4BA240, 4BW240, 4B240ET, 4E240, 39, 3E1800, 3AL240'],
  ['R-115', 110, '3A225, 3AA225, 3B225, 4BA225, 4B225, 4BW225, 3E1800, 39, 3AL225'],
  ['R-13', 100, '3A1800, 3AA1800, 3, 3E1800, 39, 3AL1800'],
  ['RC-270', 55, '3A225, 3A480X, 3AA225, 3B225, 4AA480, 4B225, 4BA225, 4BW225, 4B240ET, 3, 3E1800, 39, 3AL225'],
  ['R-12', 119, '3A225, 3AA225, 3B225, 4B225, 4BA225, 4BW225, 4B240ET, 4E225, 39, 3E1800, 3AL225'],
  ['R-500', null, '3A240, 3AA240, 3B240, 3E1800, 4B240, 4BA240, 4BW240, 4E240, 39'],
  ['R-152a', 79, '3A150, 3AA150, 3B150, 4B150, 4BA225, 4BW225, 3E1800, 3AL150'],
  ['R-1132a', 73, '3A2200, 3AA2200, 3AX2200, 3AAX2200, 3T2200, 39'],
  ['R-170', 35.8, '3A1800, 3AX1800, 3AA1800, 3AAX1800, 3, 3E1800, 3T1800, 39, 3AL1800'],
  ['R-170', 36.8, '3A2000, 3AX2000, 3AA2000, 3AAX2000, 3T2000, 39, 3AL2000'],
  ['R-1150', 31.0, '3A1800, 3AX1800, 3AA1800, 3AAX1800, 3, 3E1800, 3T1800, 39, 3AL1800'],
  ['R-1150', 32.5, '3A2000, 3AX2000, 3AA2000, 3AAX2000, 3T2000, 39, 3AL2000'],
  ['R-1150', 35.5, '3A2400, 3AX2400, 3AA2400, 3AAX2400, 3T2400, 39, 3AL2400'],
  ['R-40', 84, '3, 3A225, 3AA225, 3B225, 3E1800, 4B225, 4BA225, 4BW225, 4B240ET'],
  ['R-764', 125, '3, 3A225, 3AA225, 3AL225, 3B225, 3E1800, 4B225, 4BA225, 4BW225, 4B240ET, 39'],
  ['R-1113', 115, '3A300, 3AA300, 3B300, 3E1800, 4B300, 4BA300, 4BW300'],
]

describe('49 CFR 173.304a(a)(2)', () => {
  it.each(PRINTED)('prints for %s %s %% in %s', (designation, percent, marks) => {
    const row = fillingDensityRows(designation).find(one => one.percent === percent)
    expect(row?.specs).toEqual(marks.split(', '))
  })

  it('has no other row that names a gas', () => {
    const designations = new Set(PRINTED.map(([designation]) => designation))
    const rows = [...designations].flatMap(fillingDensityRows)
    expect(rows).toHaveLength(PRINTED.length)
    for (const designation of CATALOGUE.refrigerants.keys()) {
      if (!designations.has(designation)) expect(fillingDensityRows(designation), designation).toEqual([])
    }
  })

  it.each(PRINTED)('is met for %s (%s %%) by each of its marks and not by 1 psig less', (designation, percent, marks) => {
    const row = fillingDensityRows(designation).find(one => one.percent === percent)!
    for (const mark of marks.split(', ')) {
      const { spec, servicePressurePsig } = splitSpec(mark)!
      expect(rowFit(row, { spec, servicePressurePsig }), mark).toBe('met')
      if (servicePressurePsig === null) continue
      expect(rowFit(row, { spec, servicePressurePsig: servicePressurePsig - 1 }), mark).toBe('mark-below')
    }
  })

  it('lists in (a)(1) the specifications for liquefied gases', () => {
    const listed = ['3', '3A', '3AA', '3AL', '3B', '3BN', '3E', '4B', '4BA', '4B240ET', '4BW', '4E', '39']
    const others = ['3AX', '3AAX', '3HT', '3T', '4AA480', '4D', '4DA', '4DS', '4L', '8', '8AL', 'SP']
    for (const spec of listed) expect(isLiquefiedGasSpec(`DOT-${spec}`), spec).toBe(true)
    for (const spec of others) expect(isLiquefiedGasSpec(`DOT-${spec}`), spec).toBe(false)
  })
})

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

describe('49 CFR 173.304a(d)(1)', () => {
  it.each(PRINTED_BANDS)('prints for a specific gravity of %d to %d %d %%', (from, to, percent) => {
    expect(hydrocarbonPercent(from)).toBe(percent)
    expect(hydrocarbonPercent(to)).toBe(percent)
  })
})

describe('computed cross-check: liquid density at 131 F over water at 60 F', () => {
  // A printed filling density keeps the cylinder just short of liquid-full at 131 F.
  it.each([
    ['R-12', 119], ['R-22', 105], ['R-115', 110], ['R-142b', 100], ['R-152a', 79], ['R-717', 54],
  ])('lies above the %s row of %d %%, by 4 %% at most', (designation, percent) => {
    const liquidFullPercent = liquidDensityAt(CATALOGUE.refrigerants.get(designation)!, 55) / 0.99904 / 10
    expect(liquidFullPercent).toBeGreaterThan(percent)
    expect(liquidFullPercent).toBeLessThan(percent * 1.04)
  })

  it.each([['R-290', 0.507, 42], ['R-600a', 0.563, 49], ['R-1270', 0.523, 44], ['R-600', 0.584, 51]])(
    'puts %s at a specific gravity of %d at 60 F, so at %d %%', (designation, gravity, percent) => {
      const computed = liquidDensityAt(CATALOGUE.refrigerants.get(designation)!, (60 - 32) / 1.8) / 999.04
      expect(computed).toBeCloseTo(gravity, 2)
      expect(hydrocarbonPercent(computed)).toBe(percent)
    })
})
