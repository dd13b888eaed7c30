import { describe, expect, it } from 'vitest'
import { buildCatalogue } from '~~/utils/refrigerant/catalogue'
import { pressureCheck, whyNoCheck } from '~~/utils/refrigerant/pressureCheck'
import { fullReading } from '~~/utils/refrigerant/pressureReading'
import type { Refrigerant, RefrigerantRecord } from '~~/utils/refrigerant/types'

/**
 * A blend of round numbers: from 20 to 30 C its bubble pressure rises from 1,000 to 1,100 kPa and its dew pressure from
 * 800 to 880 kPa, so that the slope is near 10 and 8 kPa to a degree; its figures are good to 1 %.
 */
function blend(more: Partial<RefrigerantRecord> = {}): Refrigerant {
  const record = {
    designation: 'R-X', tcK: 353.15, tableMaxC: 40, relativeErrorPressure: 0.01, relativeErrorDensity: 0.003, accuracyGroup: 'B', source: 'made up',
    table: [[10, 905, 725, 1200, 30], [20, 1000, 800, 1170, 34], [30, 1100, 880, 1140, 38], [40, 1205, 965, 1110, 42]], ...more,
  } as unknown as RefrigerantRecord
  return buildCatalogue([record], []).refrigerants.get('R-X')!
}

// At a row of the table the edges are 1,000 and 800 kPa; instruments without error leave 1 % of the edge: 10 and 8 kPa.
const exact = { temperatureC: 20, gaugeErrorKPa: 0, thermometerErrorC: 0, barometerKPa: 101.325, refrigerant: blend() }

describe('a pressure against the band of a blend', () => {
  it('agrees from below its dew pressure to above its bubble pressure by what its figures may be off, and not beyond', () => {
    const verdictAt = (pressureKPa: number) => pressureCheck({ ...exact, pressureKPa }).verdict
    expect([1009.9, 1010.1].map(verdictAt)).toEqual(['agrees', 'excess'])
    expect([792.1, 791.9].map(verdictAt)).toEqual(['agrees', 'below'])
    expect([800, 900, 1000].map(verdictAt)).toEqual(['agrees', 'agrees', 'agrees'])
  })

  it('gives the gauge its error, and the thermometer its own by the slope of the nearer edge', () => {
    const high = pressureCheck({ ...exact, pressureKPa: 1050, gaugeErrorKPa: 7, thermometerErrorC: 2 })
    expect(high.slopeKPaPerC).toBeCloseTo(9.75, 0)
    expect(high.toleranceKPa).toBeCloseTo(7 + 2 * high.slopeKPaPerC, 9)
    expect(high.dataErrorKPa).toBeCloseTo(10, 9)
    expect(high.verdict).toBe('excess')
    const low = pressureCheck({ ...exact, pressureKPa: 700, gaugeErrorKPa: 7, thermometerErrorC: 2 })
    expect(low.slopeKPaPerC).toBeCloseTo(7.75, 0)
    expect(low.dataErrorKPa).toBeCloseTo(8, 9)
    expect(low.verdict).toBe('below')
  })

  it('says from where to where a reading agrees, each edge by its own slope and its own figures', () => {
    const { agreesFromKPa, agreesToKPa } = pressureCheck({ ...exact, pressureKPa: 900, gaugeErrorKPa: 7, thermometerErrorC: 2 })
    // 800 - 7 - 2 x 7.75 - 8 and 1,000 + 7 + 2 x 9.75 + 10, the slopes by the secants on either side of the row.
    expect(Math.abs(agreesFromKPa - 769.5)).toBeLessThan(1)
    expect(Math.abs(agreesToKPa - 1036.5)).toBeLessThan(1)
    expect(pressureCheck({ ...exact, pressureKPa: 900, gaugeErrorKPa: 900 }).agreesFromKPa).toBe(0)
  })

  it('measures the excess from the bubble pressure: negative within the band', () => {
    expect(pressureCheck({ ...exact, pressureKPa: 950 }).excessKPa).toBeCloseTo(-50, 9)
    expect(pressureCheck({ ...exact, pressureKPa: 1050 }).excessKPa).toBeCloseTo(50, 9)
  })

  it('stands on the air there is', () => {
    // 84.325 kPa of air is 17 less than the standard: what the gauge shows is 17 kPa less.
    const high = { ...exact, barometerKPa: 84.325 }
    expect(pressureCheck({ ...high, pressureKPa: 1026.9 }).verdict).toBe('agrees')
    expect(pressureCheck({ ...high, pressureKPa: 1027.1 }).verdict).toBe('excess')
    expect(pressureCheck({ ...high, pressureKPa: 1017 }).absoluteKPa).toBeCloseTo(1000, 9)
  })

  it('says how sure the figures are', () => {
    const doubtful = blend({ doubt: 'a pair of it was never measured' })
    expect(pressureCheck({ ...exact, refrigerant: doubtful, pressureKPa: 900 })).toMatchObject({
      accuracyGroup: 'B', doubt: 'a pair of it was never measured', relativeErrorPressure: 0.01, source: 'made up',
    })
    expect(pressureCheck({ ...exact, pressureKPa: 900 }).doubt).toBeNull()
  })

  it('is an error where nothing can be compared: off the table, below no pressure at all, by an instrument better than perfect', () => {
    for (const temperatureC of [10, 40]) expect(pressureCheck({ ...exact, temperatureC, pressureKPa: 900 }).slopeKPaPerC).toBeGreaterThan(5)
    for (const temperatureC of [9.99, 40.01, Number.NaN]) expect(() => pressureCheck({ ...exact, temperatureC, pressureKPa: 900 })).toThrow(RangeError)
    expect(pressureCheck({ ...exact, pressureKPa: 0 }).verdict).toBe('below')
    for (const wrong of [{ pressureKPa: -1 }, { pressureKPa: 900, gaugeErrorKPa: -1 }, { pressureKPa: 900, thermometerErrorC: -1 }]) {
      expect(() => pressureCheck({ ...exact, ...wrong })).toThrow(RangeError)
    }
  })
})

describe('why no check is possible', () => {
  it('is that the figures begin or end, or that there is no liquid any more', () => {
    expect(whyNoCheck(blend(), 10)).toBeNull()
    expect(whyNoCheck(blend(), 40)).toBeNull()
    expect(whyNoCheck(blend(), 9)).toContain('begin at 50.0\u00A0°F')
    expect(whyNoCheck(blend(), 41)).toContain('end at 104.0\u00A0°F')
    // 353.15 K is 80 C.
    expect(whyNoCheck(blend(), 79.9)).toContain('end at')
    expect(whyNoCheck(blend(), 80)).toContain('has no liquid: from 176.0\u00A0°F (80.0\u00A0°C) up it is a gas')
  })
})

describe('what nobody said of the instruments', () => {
  it('is a gauge to 1 psi, a thermometer to 2 F and the standard atmosphere; a perfect one stays perfect', () => {
    const said = fullReading({ pressureKPa: 1000, temperatureC: 20 })
    expect(said.gaugeErrorKPa).toBeCloseTo(6.895, 3)
    expect(said.thermometerErrorC).toBeCloseTo(1.111, 3)
    expect(said.barometerKPa).toBe(101.325)
    expect(fullReading({ pressureKPa: 1000, temperatureC: 20, gaugeErrorKPa: 0, thermometerErrorC: 0 })).toMatchObject({ gaugeErrorKPa: 0, thermometerErrorC: 0 })
  })
})
