import { describe, expect, it } from 'vitest'
import { hotDensityAtPressure } from '~~/utils/capacity/rules/hotPressure'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'

describe('the fill density at which a gas reaches a pressure at 131 F', () => {
  const r23 = CATALOGUE.supercritical.get('R-23')!

  it('is the row of its table where there is one', () => {
    expect(hotDensityAtPressure(r23, 5166.7)).toBeCloseTo(200, 4)
    expect(hotDensityAtPressure(r23, 3156.9)).toBeCloseTo(100, 4)
  })

  it('lies between the rows elsewhere', () => {
    // 5166.7 kPa at 200, 5879.4 at 250 kg/m3; the curve bends down, so half way up lies before half way along.
    const density = hotDensityAtPressure(r23, 5523)
    expect(density).toBeGreaterThan(220)
    expect(density).toBeLessThan(225)
  })

  it('is at most the last row and nothing below the first', () => {
    expect(hotDensityAtPressure(r23, 30_000)).toBe(1000)
    expect(hotDensityAtPressure(r23, 3156)).toBeNull()
  })
})
