import { describe, expect, it } from 'vitest'
import { buildCatalogue } from '~~/utils/refrigerant/catalogue'
import { pressureClassOf } from '~~/utils/refrigerant/pressureClass'
import type { Refrigerant, RefrigerantRecord } from '~~/utils/refrigerant/types'

// 45, 170 and 355 psia are 310.26, 1172.11 and 2447.64 kPa.
describe('the pressure class of a refrigerant', () => {
  it.each([
    [310.2, 'low'], [310.3, 'medium'], [1172.0, 'medium'], [1172.2, 'high'], [2447.6, 'high'], [2447.7, 'very-high'],
  ])('of %d kPa at 104 °F is %s', (kPa, pressureClass) => {
    expect(pressureClassOf(fluid(kPa))).toMatchObject({ pressureClass, at104F: { bubblePressureKPa: expect.closeTo(kPa, 6) } })
  })

  // 1.5 % of 1172.11 kPa is 17.58 kPa.
  it.each([
    [1154.4, null], [1154.7, 'high'], [1189.5, 'medium'], [1189.9, null],
  ])('of %d kPa has %s beside it', (kPa, neighbour) => {
    expect(pressureClassOf(fluid(kPa)).nearBound?.pressureClass ?? null).toBe(neighbour)
  })

  it('has the other class beside it as far as its own figures are unsure', () => {
    // 3 % of 1172.11 kPa is 35.16 kPa.
    expect(pressureClassOf(fluid(1207, { relativeErrorPressure: 0.03 })).nearBound).toMatchObject({ pressureClass: 'medium', boundKPa: expect.closeTo(1172.11, 2) })
    expect(pressureClassOf(fluid(1208, { relativeErrorPressure: 0.03 })).nearBound).toBeNull()
  })

  it('is very high where the critical temperature lies below 104 °F, whatever the table says', () => {
    expect(pressureClassOf(fluid(500, { tcK: 313.14 }))).toMatchObject({ pressureClass: 'very-high', at104F: { aboveCritical: true }, nearBound: null })
    expect(pressureClassOf(fluid(500, { tcK: 313.16 })).pressureClass).toBe('medium')
  })

  it('is an error where the table ends below 104 °F', () => {
    expect(() => pressureClassOf(fluid(500, { tableMaxC: 35 }))).toThrow(RangeError)
  })
})

/** A made-up pure refrigerant of one pressure at 104 °F (40 °C). */
function fluid(kPa: number, change: Partial<RefrigerantRecord> = {}): Refrigerant {
  const row = (tC: number, pressureKPa: number) => [tC, pressureKPa, pressureKPa, 1000 - tC, 10 + tC]
  const record: RefrigerantRecord = {
    designation: 'R-0', kind: 'pure', safetyClass: 'A1', safetyClassStatus: 'read', safetyClassSource: '', molarMass: 100,
    composition: [{ component: 'R-0', massPercent: 100 }], compositionSource: null, tcK: 370, pcKPa: 4000, nbpC: -20, glideK: 0,
    accuracyGroup: 'A', source: '', accuracy: '', tableMaxC: 70, relativeErrorPressure: 0.005, relativeErrorDensity: 0.003,
    table: [row(0, kPa / 3), row(40, kPa), row(70, kPa * 2)], ...change,
  }
  return buildCatalogue([record], []).refrigerants.get('R-0')!
}
