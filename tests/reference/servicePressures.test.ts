import { describe, expect, it } from 'vitest'
import { fillLimit } from '~~/utils/capacity/fillLimit'
import { fitFindings } from '~~/utils/capacity/fit'
import { mostDensity } from '~~/utils/capacity/rules/hotPressure'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { splitSpec } from '~~/utils/requalification/specs'
import { stampOf } from '~~/tests/helpers/stamps'

function suits(mark: string, refrigerant: string): boolean {
  const codes = fitFindings({ stamp: stampOf(splitSpec(mark)!), refrigerant, catalogue: CATALOGUE }).map(({ code }) => code)
  return !codes.includes('pressure-class')
}

function kgPerM3(designation: string, psig: number) {
  return mostDensity(CATALOGUE.supercritical.get(designation)!, psig)
}

// 49 CFR 173.301a(d): the pressure at 131 F is at most 5/4 of the service pressure. The pressures at 130 F, which are a
// little lower, are those of the page of calcspec.com labelled NIST REFPROP, psig.
describe('5/4 of the service pressure at 131 F', () => {
  it('is passed by the 478.0 psig that R-410A has at 130 F already: in a 382, in a 350, in a 260', () => {
    // 5/4 x 382 = 477.5 psig; 5/4 x 400 = 500 psig.
    expect(suits('DOT-4BA382', 'R-410A')).toBe(false)
    expect(suits('DOT-4BA350', 'R-410A')).toBe(false)
    expect(suits('DOT-4BA260', 'R-410A')).toBe(false)
    expect(suits('DOT-4BA400', 'R-410A')).toBe(true)
  })

  it('is not passed by the 198.7 psig of R-134a in a 240, the least mark of refrigerants without a row of their own', () => {
    expect(suits('DOT-4BA240', 'R-134a')).toBe(true)
    expect(suits('DOT-4BA239', 'R-134a')).toBe(false)
  })

  // R-22 has 296.9 psig at 130 F; 5/4 x 237 = 296.25 psig. Its row of 173.304a(a)(2) lets it into a 240.
  it('does not stand against the row of R-22, which names a 240', () => {
    expect(suits('DOT-4BA240', 'R-22')).toBe(true)
    expect(suits('DOT-4BA237', 'R-22')).toBe(false)
  })

  // Trade practice: a 350 is not for R-410A, a 260 not for R-404A nor R-407C. Common practice, no source.
  it.each([['R-404A', 'DOT-4BA260', 'DOT-4BA300'], ['R-407C', 'DOT-4BW260', 'DOT-4BW300'], ['R-410A', 'DOT-4BA350', 'DOT-4BA400']])(
    'keeps %s out of a %s and lets it into a %s', (refrigerant, tooLow, enough) => {
      expect(suits(tooLow, refrigerant)).toBe(false)
      expect(suits(enough, refrigerant)).toBe(true)
    })
})

// 49 CFR 173.301a(c): the pressure at 70 F is at most the service pressure; (d): at 131 F at most 5/4 of it. Not published:
// the densities at which reach them, computed apart with CoolProp 8.0.0, kg/m3.
describe('a gas at 131 F, held by two pressures', () => {
  it.each([
    ['R-23', 400, 113.51, 116.24], ['R-13', 300, 124.05, 128.85],
  ])('%s in a %d is held at 70 F: %d kg/m3, where 131 F would allow %d', (designation, psig, cool, hot) => {
    const most = kgPerM3(designation, psig)
    expect(most?.isCool).toBe(true)
    expect(Math.abs(most!.kgPerM3 / cool - 1)).toBeLessThanOrEqual(0.005)
    expect(most!.kgPerM3).toBeLessThan(hot)
  })

  it.each([
    ['R-23', 450, 135.61], ['R-23', 600, 206.76], ['R-23', 1000, 568.2], ['R-23', 1500, 811.28], ['R-23', 1800, 874.34], ['R-23', 2400, 954.93],
    ['R-13', 400, 189.4], ['R-13', 500, 270.86], ['R-13', 800, 697.61], ['R-13', 1500, 983.28],
  ])('%s in a %d is held at 131 F: %d kg/m3', (designation, psig, hot) => {
    const most = kgPerM3(designation, psig)
    expect(most?.isCool).toBe(false)
    expect(Math.abs(most!.kgPerM3 / hot - 1)).toBeLessThanOrEqual(0.005)
  })

  it('R-23 in a 3AA1800 of a litre takes 874 g by it', () => {
    const stamp = stampOf({ ...splitSpec('DOT-3AA1800')!, waterCapacity: { unit: 'kg', value: 0.99904 } })
    const limit = fillLimit({ stamp, refrigerant: 'R-23', condition: 'clean', burnt: false, policy: DEFAULT_FILL_POLICY, catalogue: CATALOGUE })
    const term = limit.terms.find(({ rule }) => rule === 'hot-pressure')
    expect(term?.limitGrams).toBeGreaterThan(870)
    expect(term?.limitGrams).toBeLessThan(878)
    expect(limit.exactLimitGrams).toBeLessThanOrEqual(878)
  })
})

// 49 CFR 173.301a(d)(1): carbon dioxide is outside the 5/4 rule; its rows in 173.304a(a)(2) decide.
describe('carbon dioxide', () => {
  it('has 5/4 of 1800 psig at 131 F when filled to 671 kg/m3, computed apart with CoolProp 8.0.0, less than 68 %', () => {
    const most = kgPerM3('R-744', 1800)!
    expect(Math.abs(most.kgPerM3 / 671.16 - 1)).toBeLessThanOrEqual(0.005)
    expect(most.kgPerM3).toBeLessThan(0.68 * 999.04)
  })

  it('is filled to 68 % in a 3AA1800 all the same', () => {
    const stamp = stampOf({ ...splitSpec('DOT-3AA1800')!, waterCapacity: { unit: 'kg', value: 10 } })
    const limit = fillLimit({ stamp, refrigerant: 'R-744', condition: 'clean', burnt: false, policy: DEFAULT_FILL_POLICY, catalogue: CATALOGUE })
    expect(limit).toMatchObject({ governingRule: 'filling-density', fillLimitGrams: 6800 })
    expect(suits('DOT-3AA1800', 'R-744')).toBe(true)
    expect(suits('DOT-3AA1799', 'R-744')).toBe(false)
  })
})
