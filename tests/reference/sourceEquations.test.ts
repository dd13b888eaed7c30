import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import type { Saturation } from '~~/utils/refrigerant/saturation'
import { saturationAt } from '~~/utils/refrigerant/saturation'
import points from './data/sourceEquations.json'

// Not published: computed with the released CoolProp 8.0.0 (Bell, Wronski, Quoilin, Lemort, Ind. Eng. Chem. Res. 53 (2014)
// 2498) at temperatures that lie between the rows of our tables. It is another run of the same equations, so it says how
// true the curve between the rows is, and nothing of how true the equations are. R-1224yd(Z) is not in that release;
// R-407F and R-454B lack the points at which its solver gave up.

type Quantity = 'bubblePressureKPa' | 'dewPressureKPa' | 'liquidDensity' | 'vapourDensity'

const COLUMNS: Quantity[] = ['bubblePressureKPa', 'dewPressureKPa', 'liquidDensity', 'vapourDensity']

// Percent.
const MOST_OFF: Record<Quantity, number> = { bubblePressureKPa: 0.05, dewPressureKPa: 0.05, liquidDensity: 0.1, vapourDensity: 0.1 }

const FLUIDS = [...Object.entries(points.pure), ...Object.entries(points.blends)]

function saturation(designation: string, tC: number): Saturation {
  return saturationAt(CATALOGUE.refrigerants.get(designation)!, tC)
}

describe('between the rows of a table', () => {
  it('every pure fluid but R-1224yd(Z) is looked at', () => {
    const pure = [...CATALOGUE.refrigerants.values()].filter(({ kind }) => kind === 'pure').map(({ designation }) => designation)
    expect(new Set(Object.keys(points.pure))).toEqual(new Set(pure.filter(designation => designation !== 'R-1224yd(Z)')))
  })

  it.each(FLUIDS)('%s keeps to its equation', (designation, rows) => {
    for (const [tC, ...values] of rows) {
      const computed = saturation(designation, tC!)
      COLUMNS.forEach((quantity, column) => {
        const percentOff = Math.abs(computed[quantity] / values[column]! - 1) * 100
        expect(percentOff, `${quantity} at ${tC} C`).toBeLessThanOrEqual(MOST_OFF[quantity])
      })
    }
  })
})

describe('outside a table', () => {
  it.each(FLUIDS.map(([designation]) => designation))('%s has no figure, only an error', (designation) => {
    const { tableMaxC } = CATALOGUE.refrigerants.get(designation)!
    expect(() => saturation(designation, -40.001)).toThrow(RangeError)
    expect(() => saturation(designation, tableMaxC + 0.001)).toThrow(RangeError)
    expect(() => saturation(designation, Number.NaN)).toThrow(RangeError)
    expect(saturation(designation, -40).liquidDensity).toBeGreaterThan(0)
    expect(saturation(designation, tableMaxC).liquidDensity).toBeGreaterThan(0)
  })
})
