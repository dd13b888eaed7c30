import { describe, expect, it } from 'vitest'
import { volumeLitres } from '~~/utils/capacity/rules/ruleInput'
import { ceilToDivision, exactGrams, floorToDivision, nearestToDivision, parseMassText, readingGrams } from '~~/utils/quantity/mass'
import { inHgFromKPa, kPaFromInHg, kPaFromPsig, psigFromKPa, STANDARD_ATMOSPHERE_KPA } from '~~/utils/quantity/pressure'
import { celsiusFromFahrenheit, fahrenheitFromCelsius, kelvinFromCelsius } from '~~/utils/quantity/temperature'
import { absoluteMmHg, inHgBelow } from '~~/utils/quantity/vacuum'
import { lb } from '~~/tests/helpers/stamps'

// International yard and pound agreement (1959): 1 lb = 0.45359237 kg exactly, 16 oz to the pound, 1 in = 25.4 mm exactly.
describe('a pound', () => {
  it('is 453.59237 g', () => {
    expect(exactGrams(lb(1))).toBe(453.59237)
    expect(exactGrams(lb(100_000))).toBe(45_359_237)
    expect(readingGrams(lb(1))).toBe(454)
  })

  it('has 16 ounces of 28.349523125 g', () => {
    expect(exactGrams({ unit: 'lb-oz', lb: 0, oz: 1 })).toBe(28.349523125)
    expect(exactGrams({ unit: 'lb-oz', lb: 1, oz: 0 })).toBe(453.59237)
    expect(exactGrams({ unit: 'lb-oz', lb: 12, oz: 8 })).toBe(exactGrams(lb(12.5)))
  })

  it('in decimals is not pounds and ounces: 12.8 lb is 12 lb 12.8 oz, not 12 lb 8 oz', () => {
    expect(exactGrams({ unit: 'lb-oz', lb: 12, oz: 12.8 })).toBeCloseTo(exactGrams(lb(12.8)), 9)
    expect(exactGrams(lb(12.8)) - exactGrams({ unit: 'lb-oz', lb: 12, oz: 8 })).toBeCloseTo(0.3 * 453.59237, 9)
  })

  // NIST Handbook 44, appendix C, prints 1 kg as 2.204 622 6 lb.
  it('goes 2.2046226 times into a kilogram', () => {
    expect(exactGrams({ unit: 'kg', value: 1 }) / exactGrams(lb(1))).toBeCloseTo(2.2046226, 7)
  })

  it.each([
    // 47.6 x 453.59237 = 21590.996812; 27.5 x 453.59237 = 12473.790175; 41 lb 13 oz = 669 oz = 18965.830970625 g.
    ['47.6lb', 21_591], ['27.5lb', 12_474], ['41lb13oz', 18_966], ['18.97kg', 18_970], ['0lb', 0], ['0.5kg', 500],
  ])('written %s is %d g', (text, grams) => {
    expect(readingGrams(parseMassText(text)!)).toBe(grams)
  })

  it.each([
    // 65.58 lb = 29746.587... g; 0.58 lb = 9.28 oz; 29.7466 kg.
    [29_746.588, lb(65.5), lb(65.6), lb(65.6)],
    [29_746.588, { unit: 'lb-oz' as const, lb: 65, oz: 9 }, { unit: 'lb-oz' as const, lb: 65, oz: 10 }, { unit: 'lb-oz' as const, lb: 65, oz: 9 }],
    [29_746.588, { unit: 'kg' as const, value: 29.74 }, { unit: 'kg' as const, value: 29.75 }, { unit: 'kg' as const, value: 29.75 }],
  ])('%d g stand on a scale between %j and %j, nearest %j', (grams, below, above, nearest) => {
    expect(floorToDivision(grams, below.unit)).toEqual(below)
    expect(ceilToDivision(grams, above.unit)).toEqual(above)
    expect(nearestToDivision(grams, nearest.unit)).toEqual(nearest)
  })
})

// NIST Special Publication 811, appendix B: 1 psi = 6.894757 kPa. ISO 2533: standard atmosphere 101.325 kPa.
describe('a gauge', () => {
  it('stands at 0 in the standard atmosphere', () => {
    expect(kPaFromPsig(0)).toBe(101.325)
    expect(psigFromKPa(101.325)).toBe(0)
    expect(STANDARD_ATMOSPHERE_KPA).toBe(101.325)
  })

  it('shows 1 psi for 6.894757 kPa', () => {
    expect(kPaFromPsig(1) - kPaFromPsig(0)).toBeCloseTo(6.894757, 6)
    expect(kPaFromPsig(400)).toBeCloseTo(400 * 6.894757 + 101.325, 3)
  })

  it('shows 14.696 psi less in a perfect vacuum', () => {
    expect(psigFromKPa(0)).toBeCloseTo(-14.696, 3)
  })

  // 355, 170 and 45 psia of 40 CFR 82.152 as gauge readings at the standard atmosphere.
  it.each([[355, 340.304], [170, 155.304], [45, 30.304]])('shows %d psia as %d psig', (psia, psig) => {
    expect(psigFromKPa(psia * 6.894757293168361)).toBeCloseTo(psig, 3)
  })
})

// NIST Special Publication 811, appendix B: a conventional inch of mercury is 3.386389 kPa. 1 in = 25.4 mm.
describe('a barometer', () => {
  it('stands at 29.92 inHg in the standard atmosphere', () => {
    expect(kPaFromInHg(1)).toBeCloseTo(3.386389, 6)
    expect(inHgFromKPa(101.325)).toBeCloseTo(29.9213, 3)
    expect(inHgFromKPa(kPaFromInHg(28.5))).toBeCloseTo(28.5, 12)
  })

  it('leaves 25.4 mmHg for each inch that a vacuum is short of it', () => {
    expect(absoluteMmHg({ inHg: 28.92 }, 29.92)).toBeCloseTo(25.4, 9)
    expect(inHgBelow(25.4, 29.92)).toBeCloseTo(28.92, 9)
    expect(absoluteMmHg({ inHg: 23.5, barometerInHg: 24.5 }, 29.92)).toBeCloseTo(25.4, 9)
  })
})

// NIST Special Publication 811, appendix B.9: t/C = (t/F - 32) / 1.8; T/K = t/C + 273.15.
describe('a thermometer', () => {
  it.each([[32, 0], [212, 100], [-40, -40], [77, 25], [122, 50], [131, 55], [140, 60], [104, 40], [130, 54.4444], [70, 21.1111], [60, 15.5556]])(
    'shows %d F for %d C', (f, c) => {
      expect(celsiusFromFahrenheit(f)).toBeCloseTo(c, 4)
      expect(fahrenheitFromCelsius(celsiusFromFahrenheit(f))).toBeCloseTo(f, 9)
    })

  it('shows 0 C at 273.15 K', () => {
    expect(kelvinFromCelsius(0)).toBe(273.15)
    expect(kelvinFromCelsius(55)).toBeCloseTo(328.15, 9)
  })
})

// 49 CFR 173.304a(a)(2), Note 1: a pound of water at 60 F takes 27.737 in3. That is of water weighed in air, 0.99793 kg/L;
// ours is its density in vacuum, 0.99904 kg/L (from memory; CRC Handbook of Chemistry and Physics, density of water).
describe('a pound of water at 60 F', () => {
  const PRINTED_LITRES = 27.737 * 2.54 ** 3 / 1000

  it('takes 0.4545 L as printed', () => {
    expect(PRINTED_LITRES).toBeCloseTo(0.45453, 5)
  })

  it('takes 0.11 % less by ours, so every limit by volume is the lower one', () => {
    expect(volumeLitres(lb(1))).toBeLessThan(PRINTED_LITRES)
    expect((1 - volumeLitres(lb(1)) / PRINTED_LITRES) * 100).toBeCloseTo(0.11, 2)
  })

  it('makes a water capacity of 47.7 lb 21.66 L', () => {
    expect(volumeLitres(lb(47.7))).toBeCloseTo(21.66, 2)
    expect(volumeLitres({ unit: 'kg', value: 0.99904 })).toBeCloseTo(1, 12)
  })
})
