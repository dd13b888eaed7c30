import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { idealMixture } from '~~/utils/refrigerant/idealMixture'
import { liquidDensityAt } from '~~/utils/refrigerant/saturation'
import { ALL_REFRIGERANTS, LIQUID_WHEN_HOT } from '~~/tests/helpers/capacityArbitraries'

const BLENDS = ALL_REFRIGERANTS.filter(({ kind }) => kind !== 'pure')

function mixed({ designation, composition }: { designation: string, composition: { component: string, massPercent: number }[] }) {
  return idealMixture({ designation, components: composition, source: 'its record' }, CATALOGUE)
}

const MIXABLE = BLENDS.filter(blend => 'fluid' in mixed(blend))

describe('a blend of the catalogue, mixed from its components', () => {
  it('is refused exactly where a component has no table or no liquid at 131 F', () => {
    expect(BLENDS.filter(blend => !MIXABLE.includes(blend)).map(({ designation }) => designation)).toEqual([
      // With R-218, isopentane or pentane, R-1336mzz(E), R-1130(E): no table of those is held.
      'R-403B', 'R-413A', 'R-424A', 'R-437A', 'R-438A', 'R-453A',
      // With carbon dioxide.
      'R-455A', 'R-470A',
      'R-471A',
      // With.
      'R-503', 'R-508B',
      'R-514A',
    ])
  })

  // The blend's own density, by the mixture model, is what ideal mixing with its derate must not exceed.
  it.each(MIXABLE.map(({ designation }) => designation))('%s is not made heavier than it is, at 77 F and at 130 F', (designation) => {
    const blend = CATALOGUE.refrigerants.get(designation)!
    const estimate = mixed(blend)
    if (!('fluid' in estimate)) throw new Error(estimate.because)
    for (const tC of [25, 54.4]) {
      const ratio = liquidDensityAt(estimate.fluid, tC) / liquidDensityAt(blend, tC)
      expect(ratio, `${tC} C`).toBeLessThanOrEqual(1)
      // Nor so light that it is of no use: 5 % of derate and 5 % of mixing.
      expect(ratio, `${tC} C`).toBeGreaterThan(0.9)
    }
  })
})

describe('any mixture of two liquids', () => {
  const anyFluid = fc.constantFrom(...LIQUID_WHEN_HOT.map(({ designation }) => designation))

  it('lies between its components, less the derate, whichever is named first', () => {
    fc.assert(fc.property(anyFluid, anyFluid, fc.integer({ min: 1, max: 99 }), (one, other, percent) => {
      fc.pre(one !== other)
      const components = [{ component: one, massPercent: percent }, { component: other, massPercent: 100 - percent }]
      const mixture = idealMixture({ designation: 'a mixture', components, source: 'made up' }, CATALOGUE)
      const turned = idealMixture({ designation: 'a mixture', components: components.toReversed(), source: 'made up' }, CATALOGUE)
      if (!('fluid' in mixture) || !('fluid' in turned)) throw new Error('is refused')
      const own = [one, other].map(name => liquidDensityAt(CATALOGUE.refrigerants.get(name)!, 25)).sort((a, b) => a - b)
      const density = liquidDensityAt(mixture.fluid, 25)
      expect(density).toBeGreaterThanOrEqual(0.95 * own[0]! * (1 - 1e-12))
      expect(density).toBeLessThanOrEqual(0.95 * own[1]! * (1 + 1e-12))
      expect(liquidDensityAt(turned.fluid, 25)).toBeCloseTo(density, 9)
    }), { numRuns: 300 })
  })

  it('of one fluid alone is that fluid, less the derate', () => {
    fc.assert(fc.property(anyFluid, (designation) => {
      const mixture = idealMixture({ designation, components: [{ component: designation, massPercent: 100 }], source: 'made up' }, CATALOGUE)
      if (!('fluid' in mixture)) throw new Error(mixture.because)
      for (const { tC, liquidDensity } of CATALOGUE.refrigerants.get(designation)!.table) {
        expect(liquidDensityAt(mixture.fluid, tC)).toBeCloseTo(0.95 * liquidDensity, 9)
      }
    }), { numRuns: 74 })
  })

  it('is refused where its shares do not make the whole, to a tenth of a percent', () => {
    fc.assert(fc.property(fc.integer({ min: 9000, max: 11_000 }), (hundredths) => {
      const components = [{ component: 'R-32', massPercent: 50 }, { component: 'R-125', massPercent: hundredths / 100 - 50 }]
      const mixture = idealMixture({ designation: 'a mixture', components, source: 'made up' }, CATALOGUE)
      expect('fluid' in mixture).toBe(Math.abs(hundredths - 10_000) <= 10)
    }), { numRuns: 500 })
  })

  it.each(['R-744', 'R-23', 'R-13', 'R-503', 'R-508B', 'R-9999'])('is refused with any %s in it', (component) => {
    fc.assert(fc.property(anyFluid, fc.integer({ min: 1, max: 99 }), (other, percent) => {
      const components = [{ component, massPercent: percent }, { component: other, massPercent: 100 - percent }]
      expect(idealMixture({ designation: 'a mixture', components, source: 'made up' }, CATALOGUE)).toMatchObject({ because: expect.stringContaining(component) })
    }), { numRuns: 20 })
  })
})
