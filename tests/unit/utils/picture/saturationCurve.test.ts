import { describe, expect, it } from 'vitest'
import { isOne, layOutSaturation, saturationInWords } from '../../../../utils/picture/saturationCurve'

// 101.325 kPa is 0 psig, 1,480.276 kPa 200 psig.
const BLEND = [
  { tC: -40, bubblePressureKPa: 101.325, dewPressureKPa: 90 },
  { tC: 0, bubblePressureKPa: 500, dewPressureKPa: 450 },
  { tC: 60, bubblePressureKPa: 1480.276, dewPressureKPa: 1400 },
]
const SINGLE = BLEND.map(row => ({ ...row, dewPressureKPa: row.bubblePressureKPa }))

describe('the picture of pressure over temperature', () => {
  it('spans the table from left to right and leaves room above the highest pressure', () => {
    const { place } = layOutSaturation(BLEND, 'psi')
    expect(place(-40, 0)).toEqual({ x: 0, y: 100 })
    expect(place(10, 0).x).toBe(50)
    const hottest = place(60, 1480.276)
    expect(hottest.x).toBe(100)
    // 1 / 1.04 of the height.
    expect(hottest.y).toBeCloseTo(100 - 96.1538, 3)
  })

  it('marks both axes in round figures of the reader\'s unit, and the other unit at the far edges', () => {
    const drawing = layOutSaturation(BLEND, 'psi')
    expect(drawing.temperatures.map(mark => mark.label)).toEqual(['−40', '0', '40', '80', '120'])
    expect(drawing.otherTemperatures.map(mark => mark.label)).toEqual(['−40', '−20', '0', '20', '40', '60'])
    expect(drawing.pressures.map(mark => mark.label)).toEqual(['0', '50', '100', '150', '200'])
    expect(layOutSaturation(BLEND, 'bar').temperatures.map(mark => mark.label)).toEqual(drawing.otherTemperatures.map(mark => mark.label))
  })

  it('puts each mark where its pressure is drawn', () => {
    const { pressures, place, zero } = layOutSaturation(BLEND, 'psi')
    expect(pressures.find(mark => mark.label === '0')?.at).toBeCloseTo(place(0, 101.325).y, 6)
    expect(pressures.find(mark => mark.label === '200')?.at).toBeCloseTo(place(0, 1480.276).y, 3)
    expect(zero).toBeCloseTo(place(0, 101.325).y, 6)
  })

  it('draws a band for a blend and one line for a single substance', () => {
    expect(layOutSaturation(BLEND, 'psi').band).toMatch(/Z$/)
    expect(layOutSaturation(SINGLE, 'psi').band).toBeNull()
  })

  it('refuses a curve of one point', () => {
    expect(() => layOutSaturation(BLEND.slice(0, 1), 'psi')).toThrow(RangeError)
  })

  it('takes bubble and dew pressure for one up to two thousandths apart', () => {
    expect(isOne({ bubblePressureKPa: 1000, dewPressureKPa: 998.1 })).toBe(true)
    expect(isOne({ bubblePressureKPa: 1000, dewPressureKPa: 997.9 })).toBe(false)
  })
})

describe('a point of the curve in words', () => {
  it('gives one pressure for a single substance, in both kinds of unit', () => {
    // 25 °C is 77 °F; 1,044 kPa less 101.325 is 942.675 kPa: 136.7 psi, 9.43 bar.
    expect(saturationInWords(25, { bubblePressureKPa: 1044, dewPressureKPa: 1044 }, 'psi').replaceAll('\u00A0', ' '))
      .toBe('At 77.0 °F (25.0 °C): 136.7 psig (9.43 bar) while liquid is left.')
  })

  it('gives bubble and dew pressure for a blend, the reader\'s unit first', () => {
    // 500 less 101.325 is 398.675 kPa: 57.8 psi; 450 less 101.325 is 348.675 kPa: 50.6 psi.
    expect(saturationInWords(0, { bubblePressureKPa: 500, dewPressureKPa: 450 }, 'bar').replaceAll('\u00A0', ' '))
      .toBe('At 0.0 °C (32.0 °F): bubble 3.99 bar (57.8 psig), dew 3.49 bar (50.6 psig).')
  })
})
