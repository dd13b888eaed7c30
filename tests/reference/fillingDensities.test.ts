import { describe, expect, it } from 'vitest'
import { fillLimit } from '~~/utils/capacity/fillLimit'
import { fillingDensityRows, isLiquefiedGasSpec, rowFit } from '~~/utils/capacity/fillingDensities'
import { fitFindings } from '~~/utils/capacity/fit'
import type { FillTerm, Stamp } from '~~/utils/capacity/types'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { liquidDensityAt } from '~~/utils/refrigerant/saturation'
import type { Catalogue } from '~~/utils/refrigerant/types'
import { splitSpec } from '~~/utils/requalification/specs'
import { catalogueOfFluid } from '~~/tests/helpers/fluids'
import { lb, stampOf } from '~~/tests/helpers/stamps'

const GRAMS_PER_POUND = 453.59237

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

// So heavy that no bound of the liquid hides what a row prints. Units: kg/m3.
const HEAVY = 2000

// The rows of R-170 and R-1150 that list a 39, which carries no pressure there: the highest.
const MOST_IN_A_39: Record<string, number> = { 'R-170': 36.8, 'R-1150': 35.5 }

function stampMarked(mark: string): Stamp {
  return stampOf({ ...splitSpec(mark)!, waterCapacity: lb(100), tareWeight: lb(60) })
}

function limitFor(stamp: Stamp, refrigerant: string, catalogue: Catalogue) {
  return fillLimit({ stamp, refrigerant, condition: 'clean', burnt: false, policy: DEFAULT_FILL_POLICY, catalogue })
}

function fillingDensityTerm(stamp: Stamp, designation: string, catalogue: Catalogue): FillTerm | undefined {
  return limitFor(stamp, designation, catalogue).terms.find(term => term.rule === 'filling-density')
}

function codes(mark: string, refrigerant: string): string[] {
  return fitFindings({ stamp: stampMarked(mark), refrigerant, catalogue: CATALOGUE }).map(({ code }) => code)
}

describe('49 CFR 173.304a(a)(2)', () => {
  it.each(PRINTED)('prints for %s %s percent in %s', (designation, percent, marks) => {
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

  it.each(PRINTED)('is met for %s (%s percent) by each of its marks and not by 1 psig less', (designation, percent, marks) => {
    const row = fillingDensityRows(designation).find(one => one.percent === percent)!
    for (const mark of marks.split(', ')) {
      const { spec, servicePressurePsig } = splitSpec(mark)!
      expect(rowFit(row, { spec, servicePressurePsig }), mark).toBe('met')
      if (servicePressurePsig === null) continue
      expect(rowFit(row, { spec, servicePressurePsig: servicePressurePsig - 1 }), mark).toBe('mark-below')
    }
  })

  // In 100 lb of water capacity a filling density in percent is a weight in pounds.
  it.each(PRINTED)('lets 100 lb of water capacity take of %s %s lb in each of %s', (designation, percent, marks) => {
    for (const mark of marks.split(', ')) {
      const term = fillingDensityTerm(stampMarked(mark), designation, catalogueOfFluid(designation, HEAVY))
      if (percent === null) {
        expect(term, mark).toMatchObject({ limitGrams: null, because: expect.stringMatching(/131/) })
      }
      else {
        // A mark without a pressure that stands in several rows takes the best of them.
        const best = mark === '39' ? MOST_IN_A_39[designation] ?? percent : percent
        expect(term?.limitGrams, mark).toBe(Math.floor(best * GRAMS_PER_POUND + 1e-6))
      }
    }
  })

  it.each([
    ['3AA1800', 68], ['3AA1999', 68], ['3AA2000', 70.3], ['3AA2264', 70.3], ['3AA2265', 73.2], ['3AA2399', 73.2], ['3AA2400', 74.5],
  ])('lets a %s take R-744 up to %d percent and no other rule speak', (mark, percent) => {
    const limit = limitFor(stampMarked(mark), 'R-744', CATALOGUE)
    expect(limit.governingRule).toBe('filling-density')
    expect(limit.fillLimitGrams).toBe(Math.floor(percent * GRAMS_PER_POUND + 1e-6))
  })

  it('gives R-744 no figure in a cylinder below 1800 psig', () => {
    expect(limitFor(stampMarked('3AA1799'), 'R-744', CATALOGUE).fillLimitGrams).toBeNull()
    expect(limitFor(stampMarked('4BA400'), 'R-744', CATALOGUE).fillLimitGrams).toBeNull()
  })

  // "Refrigerant gas, n.o.s.": 3A240, 3AA240, 3AL240, 3B240, 3E1800, 4B240, 4BA240, 4BW240, 4E240, 39.
  it.each(['R-134a', 'R-124', 'R-513A', 'R-1234ze(E)', 'R-227ea'])('asks of a cylinder for %s, which no row names, 240 psig', (designation) => {
    for (const type of ['3A', '3AA', '3AL', '3B', '4B', '4BA', '4BW', '4E']) {
      expect(codes(`${type}240`, designation), type).not.toContain('pressure-class')
      expect(codes(`${type}239`, designation), type).toContain('pressure-class')
    }
  })

  it.each([
    ['R-12', '4BA225', '4BA224'], ['R-22', '4BW240', '4BW239'], ['R-115', '4B225', '4B224'], ['R-142b', '3AA150', '3AA149'],
    ['R-152a', '3AL150', '3AL149'], ['R-717', '3AA480', '3AA479'], ['R-500', '4BA240', '4BA239'], ['R-13', '3AA1800', '3AA1799'],
  ])('lets %s into a %s and not into a %s', (designation, enough, tooLow) => {
    expect(codes(enough, designation)).not.toContain('pressure-class')
    expect(codes(tooLow, designation)).toContain('pressure-class')
  })

  it('lists in (a)(1) the specifications for liquefied gases', () => {
    const listed = ['3', '3A', '3AA', '3AL', '3B', '3BN', '3E', '4B', '4BA', '4B240ET', '4BW', '4E', '39']
    const others = ['3AX', '3AAX', '3HT', '3T', '4AA480', '4D', '4DA', '4DS', '4L', '8', '8AL', 'SP']
    for (const spec of listed) expect(isLiquefiedGasSpec(`DOT-${spec}`), spec).toBe(true)
    for (const spec of others) expect(isLiquefiedGasSpec(`DOT-${spec}`), spec).toBe(false)
  })
})

describe('computed cross-check: liquid density at 131 F over water at 60 F', () => {
  // A printed filling density keeps the cylinder just short of liquid-full at 131 F.
  it.each([
    ['R-12', 119], ['R-22', 105], ['R-115', 110], ['R-142b', 100], ['R-152a', 79], ['R-717', 54],
  ])('lies above the %s row of %d percent, by 4 percent at most', (designation, percent) => {
    const liquidFullPercent = liquidDensityAt(CATALOGUE.refrigerants.get(designation)!, 55) / 0.99904 / 10
    expect(liquidFullPercent).toBeGreaterThan(percent)
    expect(liquidFullPercent).toBeLessThan(percent * 1.04)
  })
})
