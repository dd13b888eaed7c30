import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { hasLiquidAt, saturationAt } from '~~/utils/refrigerant/saturation'
import type { Refrigerant } from '~~/utils/refrigerant/types'

const ATMOSPHERE_KPA = 101.325

function refrigerant(designation: string): Refrigerant {
  return CATALOGUE.refrigerants.get(designation)!
}

/** The temperature at which a refrigerant's vapour pressure is one atmosphere, bubble and dew; null where its table begins above it. */
function boilingPoint(designation: string, edge: 'bubblePressureKPa' | 'dewPressureKPa'): number | null {
  const fluid = refrigerant(designation)
  let [cold, warm] = [-40, fluid.tableMaxC]
  if (!hasLiquidAt(fluid, cold) || saturationAt(fluid, cold)[edge] > ATMOSPHERE_KPA) return null
  while (warm - cold > 1e-6) {
    const middle = (cold + warm) / 2
    if (saturationAt(fluid, middle)[edge] > ATMOSPHERE_KPA) warm = middle
    else cold = middle
  }
  return cold
}

// Real Decreto 552/2019 (Spain), instruction IF-02, table A: bubble and dew point at 101.3 kPa, C; and by how many kelvin
// ours may be off, which is what the refrigerant's pressures deserve: 0.7 K is about 3 % of pressure. R-408A is printed
// without its minus sign; R-414B with the figures of R-414A, so it is left out.
const DECREE: [designation: string, bubbleC: number, dewC: number, kelvin: number][] = [
  ['R-401A', -33.4, -27.8, 0.5],
  ['R-402A', -49.2, -47.0, 0.7],
  ['R-403B', -49.1, -46.8, 0.3],
  ['R-408A', -44.6, -44.1, 0.1],
  ['R-409A', -34.7, -26.3, 0.4],
  ['R-416A', -23.9, -22.1, 0.3],
  ['R-424A', -39.1, -33.3, 1.2],
  ['R-437A', -32.9, -29.2, 0.6],
  ['R-438A', -43.0, -36.4, 0.6],
  ['R-453A', -42.5, -35.0, 0.2],
]

describe('the boiling points of Real Decreto 552/2019, IF-02, table A', () => {
  it.each(DECREE)('%s: %d / %d C, within %d K', (designation, bubbleC, dewC, kelvin) => {
    expect(Math.abs(refrigerant(designation).nbpC - bubbleC)).toBeLessThanOrEqual(kelvin)
    const bubble = boilingPoint(designation, 'bubblePressureKPa')
    if (bubble !== null) expect(Math.abs(bubble - bubbleC)).toBeLessThanOrEqual(kelvin)
    const dew = boilingPoint(designation, 'dewPressureKPa')
    if (dew !== null) expect(Math.abs(dew - dewC)).toBeLessThanOrEqual(kelvin)
  })

  it.each([['R-500', -33.5, 0.6], ['R-502', -45.4, 0.7]])('%s, an azeotrope: %d C, within %d K', (designation, tC, kelvin) => {
    expect(Math.abs(refrigerant(designation).nbpC - tC)).toBeLessThanOrEqual(kelvin)
  })

  // These two lie 3 to 5 K too cold, so up to a fifth too high in pressure. That must travel with every value of them.
  it.each([['R-413A', -29.4], ['R-470A', -62.7]])('%s begins to boil at %d C in print and earlier by our equation: it is held in doubt', (designation, bubbleC) => {
    expect(bubbleC - refrigerant(designation).nbpC).toBeGreaterThan(3)
    expect(bubbleC - refrigerant(designation).nbpC).toBeLessThan(5)
    expect(saturationAt(refrigerant(designation), 0).doubt).toMatch(/\w/)
  })

  it('R-413A has boiled away at -27.4 C, within 0.7 K', () => {
    expect(Math.abs(boilingPoint('R-413A', 'dewPressureKPa')! - -27.4)).toBeLessThanOrEqual(0.7)
  })
})

describe('the boiling points of AHRI 700-2006, addendum 1', () => {
  it.each([
    ['R-427A', -43.0, -36.3, 0.2], ['R-428A', -48.3, -47.5, 0.2], ['R-434A', -45.1, -42.4, 0.2], ['R-437A', -32.9, -29.2, 0.6],
  ])('%s: %d / %d C, within %d K', (designation, bubbleC, dewC, kelvin) => {
    expect(Math.abs(refrigerant(designation).nbpC - bubbleC)).toBeLessThanOrEqual(kelvin)
    const dew = boilingPoint(designation, 'dewPressureKPa')
    if (dew !== null) expect(Math.abs(dew - dewC)).toBeLessThanOrEqual(kelvin)
  })
})

// From memory: normal boiling points of ANSI/ASHRAE Standard 34, C, printed to 0.1 K.
const REMEMBERED: [string, number][] = [
  ['R-11', 23.7], ['R-12', -29.8], ['R-13', -81.4], ['R-22', -40.8], ['R-32', -51.7], ['R-113', 47.6], ['R-114', 3.6],
  ['R-123', 27.8], ['R-124', -12.0], ['R-125', -48.1], ['R-134a', -26.1], ['R-142b', -9.1], ['R-143a', -47.2], ['R-152a', -24.0],
  ['R-227ea', -16.3], ['R-236fa', -1.4], ['R-245fa', 15.1], ['R-290', -42.1], ['R-600', -0.5], ['R-600a', -11.7], ['R-717', -33.3],
  ['R-1270', -47.6], ['R-1234yf', -29.5], ['R-1234ze(E)', -19.0],
]

describe('the boiling points of ASHRAE 34, from memory', () => {
  it.each(REMEMBERED)('%s boils at %d C', (designation, tC) => {
    expect(Math.abs(refrigerant(designation).nbpC - tC)).toBeLessThanOrEqual(0.1)
    const boiling = boilingPoint(designation, 'bubblePressureKPa')
    if (boiling !== null) expect(Math.abs(boiling - tC)).toBeLessThanOrEqual(0.1)
  })
})

// Headers of the pseudo-pure fluids after Lemmon, Int. J. Thermophys. 24 (2003) 991: boiling point and critical point.
describe('the fixed points of two blends', () => {
  it.each([
    ['R-410A', 221.71, 344.494, 4901.2, 0.001], ['R-407C', 229.52, 359.345, 4631.7, 0.2],
  ])('%s boils at %d K and is critical at %d K and %d kPa', (designation, boilingK, criticalK, criticalKPa, percent) => {
    const fluid = refrigerant(designation)
    expect(fluid.nbpC + 273.15).toBeCloseTo(boilingK, 1)
    expect(Math.abs(fluid.tcK / criticalK - 1) * 100).toBeLessThanOrEqual(Math.max(0.02, percent))
    expect(Math.abs(fluid.pcKPa / criticalKPa - 1) * 100).toBeLessThanOrEqual(percent)
  })
})

describe('the fixed points of data sheets', () => {
  it('R-515B: boils at -18.9 C, critical at 108.6 C, 117.50 g/mol', () => {
    const { nbpC, tcK, molarMass } = refrigerant('R-515B')
    expect(nbpC).toBeCloseTo(-18.9, 1)
    expect(tcK - 273.15).toBeCloseTo(108.6, 1)
    expect(molarMass).toBeCloseTo(117.5, 1)
  })

  // DuPont T-23, properties of R-23. Our equation's critical temperature lies 0.2 K higher.
  it('R-23: boils at -82.03 C, critical at 25.92 C and 4836 kPa', () => {
    const { nbpC, tcK, pcKPa } = refrigerant('R-23')
    expect(nbpC).toBeCloseTo(-82.03, 1)
    expect(Math.abs(tcK - 273.15 - 25.92)).toBeLessThanOrEqual(0.25)
    expect(Math.abs(pcKPa / 4836 - 1) * 100).toBeLessThanOrEqual(0.1)
  })

  it.each([['R-1233zd(E)', 18.1], ['R-1336mzz(Z)', 33.4]])('%s boils at %d C', (designation, tC) => {
    expect(Math.abs(boilingPoint(designation, 'bubblePressureKPa')! - tC)).toBeLessThanOrEqual(0.1)
  })
})
