import { describe, expect, it } from 'vitest'
import {
  barometerFromKPa, celsiusFromThermometer, formatBarometer, formatDifference, formatGauge, formatThermometer, gaugeFromKPa, gaugeUnitFor, GAUGE_UNITS, kPaFromBarometer,
  kPaFromGauge, plainFigure, thermometerFromCelsius,
} from '~~/utils/quantity/gauge'

describe('a gauge', () => {
  it('is the one that goes with the scale', () => {
    expect((['lb', 'lb-oz', 'kg'] as const).map(gaugeUnitFor)).toEqual(['psi', 'psi', 'bar'])
  })

  it('stands on the standard atmosphere, 101.325 kPa', () => {
    expect(GAUGE_UNITS.map(unit => kPaFromGauge(0, unit))).toEqual([101.325, 101.325, 101.325])
    expect(kPaFromGauge(10, 'bar')).toBe(1101.325)
    expect(kPaFromGauge(500, 'kPa')).toBe(601.325)
    // 100 x 6.894757 = 689.4757.
    expect(kPaFromGauge(100, 'psi')).toBe(790.801)
  })

  it('gives every reading back as it was read, to a tenth of a psi, a hundredth of a bar, a kPa', () => {
    const divisions = { psi: 0.1, bar: 0.01, kPa: 1 }
    for (const unit of GAUGE_UNITS) {
      for (let count = -60; count < 6000; count += 7) {
        const reading = Number((count * divisions[unit]).toFixed(2))
        expect(plainFigure(gaugeFromKPa(kPaFromGauge(reading, unit), unit)), unit).toBe(String(reading))
      }
    }
  })

  it('reads in words, below the air with a minus', () => {
    expect(formatGauge(1731.938, 'psi')).toBe('236.5\u00A0psig')
    expect(formatGauge(1731.938, 'bar')).toBe('16.31\u00A0bar')
    expect(formatGauge(1731.938, 'kPa')).toBe('1631\u00A0kPa')
    expect(formatGauge(67.541, 'psi')).toBe('\u22124.9\u00A0psig')
    expect(formatGauge(101.2, 'psi')).toBe('0.0\u00A0psig')
    expect(formatDifference(137.895, 'psi')).toBe('20.0\u00A0psi')
  })
})

describe('the thermometer and the barometer beside it', () => {
  it('read °F and inHg beside psi, °C and kPa beside the others', () => {
    expect(celsiusFromThermometer(80, 'psi')).toBe(26.667)
    expect(celsiusFromThermometer(26.7, 'bar')).toBe(26.7)
    expect(plainFigure(thermometerFromCelsius(26.667, 'psi'))).toBe('80')
    expect(formatThermometer(26.667, 'psi')).toBe('80.0\u00A0°F')
    expect(formatThermometer(-20, 'kPa')).toBe('\u221220.0\u00A0°C')
    // 29.921 inHg is the standard atmosphere (ISO 2533 gives 760 mm).
    expect(kPaFromBarometer(29.921, 'psi')).toBeCloseTo(101.325, 2)
    expect(kPaFromBarometer(84.3, 'bar')).toBe(84.3)
    expect(plainFigure(barometerFromKPa(84.321, 'psi'))).toBe('24.9')
    expect(formatBarometer(84.321)).toBe('24.9\u00A0inHg (84.3\u00A0kPa)')
  })
})
