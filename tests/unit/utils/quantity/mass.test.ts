import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { MassReading, MassUnit } from '~~/utils/quantity/mass'
import {
  ceilToDivision, exactGrams, floorToDivision, formatFigure, formatMass, formatReading, hundredthsText, massText, nearestToDivision,
  parseMassText, readingGrams,
} from '~~/utils/quantity/mass'

/** Text with plain spaces in place of no-break ones. */
function plain(text: string): string {
  return text.replaceAll('\u00A0', ' ')
}

describe('a reading in grams', () => {
  it('takes the pound as exactly 453.59237 grams', () => {
    expect(exactGrams({ unit: 'lb', value: 1000 })).toBeCloseTo(453_592.37, 6)
    expect(exactGrams({ unit: 'lb-oz', lb: 0, oz: 16 })).toBeCloseTo(453.59237, 9)
    expect(exactGrams({ unit: 'kg', value: 18.97 })).toBeCloseTo(18_970, 6)
  })

  it('goes to the nearest whole gram', () => {
    expect(readingGrams({ unit: 'lb', value: 47.6 })).toBe(21_591)
    expect(readingGrams({ unit: 'lb', value: 27.5 })).toBe(12_474)
    expect(readingGrams({ unit: 'lb-oz', lb: 41, oz: 13.5 })).toBe(18_980)
  })

  it('keeps zero as a mass', () => {
    expect(readingGrams({ unit: 'lb', value: 0 })).toBe(0)
  })
})

describe('a mass in a query', () => {
  it.each<[string, MassReading]>([
    ['47.6lb', { unit: 'lb', value: 47.6 }],
    ['41lb13oz', { unit: 'lb-oz', lb: 41, oz: 13 }],
    ['41lb13.5oz', { unit: 'lb-oz', lb: 41, oz: 13.5 }],
    ['18.97kg', { unit: 'kg', value: 18.97 }],
    ['0lb15.9oz', { unit: 'lb-oz', lb: 0, oz: 15.9 }],
  ])('%s is read and written back', (text, reading) => {
    expect(parseMassText(text)).toEqual(reading)
    expect(massText(reading)).toBe(text)
  })

  it.each(['', '47.6', '-1lb', '47,6lb', '41lb16oz', '41.5lb3oz', '1e3kg', 'lb', '47.6 lb', '12g', 'NaNkg'])('%j is none', (text) => {
    expect(parseMassText(text)).toBeNull()
  })
})

describe('the division of a scale', () => {
  it('shows 34.2 lb for a tare of 15.0 lb and 80 % of 24.0 lb, as on paper', () => {
    const stop = exactGrams({ unit: 'lb', value: 15 }) + exactGrams({ unit: 'lb', value: 24 }) * 0.8
    expect(floorToDivision(stop, 'lb')).toEqual({ unit: 'lb', value: 34.2 })
  })

  it('rounds 65.58 lb down to 65.5 lb, 65 lb 9 oz and 29.74 kg', () => {
    const grams = 65.58 * 453.59237
    expect(floorToDivision(grams, 'lb')).toEqual({ unit: 'lb', value: 65.5 })
    expect(floorToDivision(grams, 'lb-oz')).toEqual({ unit: 'lb-oz', lb: 65, oz: 9 })
    expect(floorToDivision(grams, 'kg')).toEqual({ unit: 'kg', value: 29.74 })
  })

  it('lets half a gram of conversion noise through and no more', () => {
    expect(floorToDivision(9999.5, 'kg')).toEqual({ unit: 'kg', value: 10 })
    expect(floorToDivision(9999.4, 'kg')).toEqual({ unit: 'kg', value: 9.99 })
    expect(ceilToDivision(10_000.5, 'kg')).toEqual({ unit: 'kg', value: 10 })
    expect(ceilToDivision(10_000.6, 'kg')).toEqual({ unit: 'kg', value: 10.01 })
  })

  it('rounds what is below zero down to what is further below', () => {
    expect(floorToDivision(-20, 'lb')).toEqual({ unit: 'lb', value: -0.1 })
    expect(floorToDivision(-500, 'lb-oz')).toEqual({ unit: 'lb-oz', lb: -1, oz: -2 })
    expect(exactGrams(floorToDivision(-500, 'lb-oz'))).toBeLessThanOrEqual(-500)
  })

  it('never gives a negative zero', () => {
    expect(Object.is(nearestToDivision(-1, 'lb-oz'), -0)).toBe(false)
    expect(nearestToDivision(-1, 'lb-oz')).toEqual({ unit: 'lb-oz', lb: 0, oz: 0 })
  })

  const unit = fc.constantFrom<MassUnit>('lb', 'lb-oz', 'kg')

  it('never rounds a stop weight up', () => {
    fc.assert(fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), unit, (grams, to) => {
      const shown = exactGrams(floorToDivision(grams, to))
      expect(shown).toBeLessThanOrEqual(grams + 0.5 + 1e-6)
      // Nor gives away more than one division: at most 0.1 lb, 45.36 g.
      expect(shown).toBeGreaterThan(grams + 0.5 - 45.36)
    }))
  })

  it('never rounds an excess down', () => {
    fc.assert(fc.property(fc.double({ min: 0, max: 1e6, noNaN: true }), unit, (grams, to) => {
      expect(exactGrams(ceilToDivision(grams, to))).toBeGreaterThanOrEqual(grams - 0.5 - 1e-6)
    }))
  })

  it('gives every reading of a scale back after it was kept as whole grams', () => {
    const reading = fc.oneof(
      fc.nat(30_000).map((tenths): MassReading => ({ unit: 'lb', value: tenths / 10 })),
      fc.tuple(fc.nat(3000), fc.nat(15)).map(([lb, oz]): MassReading => ({ unit: 'lb-oz', lb, oz })),
      fc.nat(150_000).map((hundredths): MassReading => ({ unit: 'kg', value: hundredths / 100 })),
    )
    fc.assert(fc.property(reading, (read) => {
      const grams = readingGrams(read)
      expect(floorToDivision(grams, read.unit)).toEqual(read)
      expect(nearestToDivision(grams, read.unit)).toEqual(read)
      expect(ceilToDivision(grams, read.unit)).toEqual(read)
      expect(parseMassText(massText(read))).toEqual(read)
    }))
  })
})

describe('a mass as it is shown', () => {
  it('stands in pounds, in pounds and ounces, in kilograms, with a space that does not break', () => {
    expect(formatMass(29_960, 'lb', 'down')).toBe('66.0\u00A0lb')
    expect(formatMass(29_960, 'lb-oz', 'down')).toBe('66\u00A0lb\u00A00\u00A0oz')
    expect(formatMass(29_960, 'kg', 'down')).toBe('29.96\u00A0kg')
  })

  it('keeps the last symbol apart for the large figure', () => {
    expect(formatFigure(29_960, 'lb', 'down')).toEqual({ figure: '66.0', symbol: 'lb' })
    expect(formatFigure(29_960, 'lb-oz', 'down')).toEqual({ figure: '66\u00A0lb\u00A00', symbol: 'oz' })
    expect(formatFigure(29_960, 'kg', 'down')).toEqual({ figure: '29.96', symbol: 'kg' })
  })

  it('rounds the way it is asked to', () => {
    expect(plain(formatMass(100, 'lb', 'down'))).toBe('0.2 lb')
    expect(plain(formatMass(100, 'lb', 'up'))).toBe('0.3 lb')
    expect(plain(formatMass(120, 'lb', 'nearest'))).toBe('0.3 lb')
  })

  it('is in ounces alone where there is no whole pound', () => {
    expect(plain(formatMass(340, 'lb-oz', 'nearest'))).toBe('12 oz')
    expect(plain(formatMass(0, 'lb-oz', 'nearest'))).toBe('0 oz')
    expect(formatFigure(-340, 'lb-oz', 'nearest')).toEqual({ figure: '−12', symbol: 'oz' })
    expect(plain(formatMass(454, 'lb-oz', 'nearest'))).toBe('1 lb 0 oz')
  })

  it('puts one minus before what is below zero', () => {
    expect(plain(formatMass(-1361, 'lb', 'nearest'))).toBe('−3.0 lb')
    expect(plain(formatMass(-539, 'lb-oz', 'nearest'))).toBe('−1 lb 3 oz')
    expect(plain(formatMass(-28, 'lb-oz', 'nearest'))).toBe('−1 oz')
    expect(plain(formatMass(-0.2, 'kg', 'down'))).toBe('0.00 kg')
  })
})

describe('a reading as it is shown', () => {
  it.each<[MassReading, string]>([
    [{ unit: 'lb', value: 24 }, '24.0 lb'],
    [{ unit: 'lb', value: 26.25 }, '26.25 lb'],
    [{ unit: 'lb-oz', lb: 41, oz: 13.5 }, '41 lb 13.5 oz'],
    [{ unit: 'kg', value: 18.9 }, '18.90 kg'],
  ])('keeps what was entered: %j', (reading, shown) => {
    expect(plain(formatReading(reading))).toBe(shown)
  })
})

describe('a sum before it is rounded to a scale', () => {
  it.each([
    // 38.16 lb = 17,309.08 g; 0.005 lb less still shows 38.15.
    [17_309, 'lb', '38.16'], [17_307, 'lb', '38.15'],
    // 37.70 lb = 17,100.43 g: within half a gram it is reached, below not.
    [17_100, 'lb', '37.70'], [17_099, 'lb', '37.69'],
    [17_100, 'kg', '17.10'], [17_099, 'kg', '17.09'],
  ] as const)('%d g stand as %s %s', (grams, unit, text) => {
    expect(hundredthsText(grams, unit)).toBe(text)
  })
})
