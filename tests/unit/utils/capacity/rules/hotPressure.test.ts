import { describe, expect, it } from 'vitest'
import { densityAtPressure, mostDensity } from '~~/utils/capacity/rules/hotPressure'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'

const r23 = CATALOGUE.supercritical.get('R-23')!

describe('the fill density at which a gas reaches a pressure at 131 F', () => {
  const hotDensityAtPressure = (kPa: number) => densityAtPressure(r23, 55, kPa)

  it('is the row of its table where there is one', () => {
    expect(hotDensityAtPressure(5166.7)).toBeCloseTo(200, 4)
    expect(hotDensityAtPressure(3156.9)).toBeCloseTo(100, 4)
  })

  it('lies between the rows elsewhere', () => {
    // 5166.7 kPa at 200, 5879.4 at 250 kg/m3; the curve bends down, so half way up lies before half way along.
    const density = hotDensityAtPressure(5523)
    expect(density).toBeGreaterThan(220)
    expect(density).toBeLessThan(225)
  })

  it('is at most the last row and nothing below the first', () => {
    expect(hotDensityAtPressure(30_000)).toBe(1000)
    expect(hotDensityAtPressure(3156)).toBeNull()
  })
})

describe('the most that a service pressure allows of R-23, a gas when hot', () => {
  it('is held by the pressure at 70 F in a cylinder of 400 psig', () => {
    // 400 psig = 2859.2 kPa absolute, between 2621.8 at 100 and 3388.1 at 150 kg/m3; the curve bends down, so before 115.5.
    // 1.25 x 400 psig at 131 F would allow 116 to 118 kg/m3.
    const most = mostDensity(r23, 400)
    expect(most?.isCool).toBe(true)
    expect(most?.kgPerM3).toBeGreaterThan(113)
    expect(most?.kgPerM3).toBeLessThan(115.5)
  })

  it('is held by the pressure at 131 F where liquid and vapour share the cylinder at 70 F', () => {
    // 1800 psig is far above the 4274.1 kPa at which R-23 boils at 70 F: 15,614 kPa at 131 F decides.
    expect(mostDensity(r23, 1800)?.isCool).toBe(false)
  })

  it('is nothing where even the thinnest fill of the table passes the mark at 70 F', () => {
    // 2621.8 kPa at 100 kg/m3 is 365.6 psig; at 131 F 5/4 of 365 psig, 3246.9 kPa, would allow 100 kg/m3 and more.
    expect(mostDensity(r23, 365)).toBeNull()
    expect(mostDensity(r23, 366)?.kgPerM3).toBeCloseTo(100, 0)
  })
})
