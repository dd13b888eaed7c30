import { describe, expect, it } from 'vitest'
import { fillLimit } from '~~/utils/capacity/fillLimit'
import type { FillLimit, FillRule } from '~~/utils/capacity/types'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { MassReading } from '~~/utils/quantity/mass'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { stampOf } from '~~/tests/helpers/stamps'

// A litre of water at 60 F, so that a limit in grams is a filling ratio in thousandths of a kg/L.
const LITRE_OF_WATER: MassReading = { unit: 'kg', value: 0.99904 }

function limitOf(refrigerant: string, burnt = false): FillLimit {
  return fillLimit({
    stamp: stampOf({ waterCapacity: LITRE_OF_WATER, servicePressurePsig: 500 }), refrigerant, condition: burnt ? 'burnt' : 'clean', burnt,
    policy: DEFAULT_FILL_POLICY, catalogue: CATALOGUE,
  })
}

/** What a rule gives, kg/L, to the thousandth below. */
function ratio(refrigerant: string, rule: FillRule = 'un-ratio', burnt = false): number {
  return (limitOf(refrigerant, burnt).terms.find(term => term.rule === rule)?.limitGrams ?? Number.NaN) / 1000
}

// 49 CFR 173.313, portable tank instruction T50, as read: maximum filling density, kg/L. It is made by the same rule for
// larger vessels. How far ours may be off is by what the table's two decimals and its older densities leave.
describe('the filling ratios of 49 CFR 173.313', () => {
  it.each([
    ['R-12', 1.15], ['R-22', 1.03], ['R-32', 0.78], ['R-114', 1.3], ['R-124', 1.2], ['R-125', 0.87], ['R-134a', 1.04],
    ['R-142b', 0.99], ['R-152a', 0.79], ['R-227ea', 1.2], ['R-290', 0.42], ['R-407A', 0.95], ['R-407C', 0.95], ['R-600', 0.51],
    ['R-600a', 0.49], ['R-717', 0.53], ['R-1270', 0.43], ['R-115', 1.06],
  ])('print for %s %d kg/L, which our computed ratio meets within 1.6 percent', (refrigerant, printed) => {
    expect(Math.abs(ratio(refrigerant) / printed - 1)).toBeLessThanOrEqual(0.016)
  })

  it.each([['R-143a', 0.76], ['R-404A', 0.84], ['R-500', 1.01], ['R-502', 1.05]])(
    'print for %s %d kg/L, up to 4.5 percent more than our computed ratio', (refrigerant, printed) => {
      expect(ratio(refrigerant)).toBeLessThan(printed)
      expect(ratio(refrigerant)).toBeGreaterThan(printed * 0.955)
    })

  it('print for R-125 0.87 kg/L, which is taken as printed', () => {
    expect(ratio('R-125')).toBe(0.87)
  })

  it('print nothing for the gases that are above their critical temperature at 60 C, and neither do we', () => {
    for (const refrigerant of ['R-13', 'R-23', 'R-744', 'R-503', 'R-508B']) expect(ratio(refrigerant), refrigerant).toBeNaN()
  })
})

// P200, table 2 of the UN model regulations, from memory: kg/L. R-125 stands there with 0.95 for a higher test pressure
// than the rule of 50 and 60 C asks, so it is left out.
describe('the filling ratios of P200, from memory', () => {
  it.each([
    ['R-717', 0.54], ['R-12', 1.15], ['R-22', 1.03], ['R-32', 0.78], ['R-114', 1.3], ['R-115', 1.05], ['R-124', 1.2],
    ['R-134a', 1.05], ['R-142b', 0.99], ['R-143a', 0.73], ['R-152a', 0.79], ['R-227ea', 1.21], ['R-290', 0.43], ['R-404A', 0.82],
    ['R-407A', 0.94], ['R-407C', 0.95], ['R-500', 1.01], ['R-502', 1.01], ['R-600a', 0.49], ['R-1270', 0.43],
  ])('give %s %d kg/L, which our computed ratio meets within 1.9 percent', (refrigerant, remembered) => {
    expect(Math.abs(ratio(refrigerant) / remembered - 1)).toBeLessThanOrEqual(0.019)
  })
})

// ADR 2017, 4.3.3.2.2, and 49 CFR 173.304b(b): 0.95 of the liquid's density at 50 C, and never liquid-full at 60 C. The
// densities are not published: computed apart with CoolProp 8.0.0, kg/m3 at 50 and at 60 C.
describe('the lower of 0.95 at 50 C and full at 60 C', () => {
  it.each([
    ['R-12', 1213.031, 1168.15, 1.15238], ['R-22', 1082.302, 1030.384, 1.02819], ['R-134a', 1102.306, 1052.862, 1.04719],
    ['R-290', 448.868, 427.973, 0.42642], ['R-600a', 517.371, 502.709, 0.4915], ['R-717', 562.988, 545.316, 0.53484],
    ['R-1234yf', 989.919, 940.551, 0.94042],
  ])('is the first for %s: %d and %d kg/m3 make %d kg/L', (refrigerant, at50C, at60C, lower) => {
    expect(0.95 * at50C).toBeLessThan(at60C)
    expect(Math.abs(ratio(refrigerant) - lower)).toBeLessThanOrEqual(0.0011)
  })

  it.each([
    ['R-32', 839.256, 773.311, 0.77331], ['R-143a', 802.972, 728.856, 0.72886], ['R-115', 1142.999, 1067.55, 1.06755],
  ])('is the second for %s: %d and %d kg/m3 make %d kg/L', (refrigerant, at50C, at60C, lower) => {
    expect(0.95 * at50C).toBeGreaterThan(at60C)
    expect(Math.abs(ratio(refrigerant) - lower)).toBeLessThanOrEqual(0.0011)
  })
})

// TRG 102, annex, group 3.1 (German technical rules for pressure gases, repealed): kg/L.
describe('the filling ratios of TRG 102', () => {
  it('give R-401A 1.01 kg/L, which our limit stays under and our computed ratio meets within 3.5 %', () => {
    expect(limitOf('R-401A').exactLimitGrams).toBeLessThanOrEqual(1010)
    expect(Math.abs(ratio('R-401A') / 1.01 - 1)).toBeLessThan(0.035)
  })

  it.each([['R-401B', 1.01], ['R-401C', 1.03]])('give %s %d kg/L, which our ratio by ideal mixing lies 2 to 4 percent under', (refrigerant, printed) => {
    expect(limitOf(refrigerant).exactLimitGrams).toBeLessThanOrEqual(printed * 1000)
    expect(ratio(refrigerant) / printed).toBeGreaterThan(0.96)
    expect(ratio(refrigerant) / printed).toBeLessThan(0.98)
  })

  it('give R-22 with compressor oil 0.75 kg/L, which our oily limit meets within 0.5 % and stays under', () => {
    const burnt = limitOf('R-22', true)
    expect(burnt.governingRule).toBe('oily')
    expect(burnt.exactLimitGrams).toBeLessThanOrEqual(750)
    expect(burnt.exactLimitGrams).toBeGreaterThan(746)
  })

  it('give R-12 with compressor oil 0.75 kg/L, which is our oily limit of it', () => {
    const burnt = limitOf('R-12', true)
    expect(burnt.governingRule).toBe('oily')
    expect(burnt.exactLimitGrams).toBeCloseTo(750, 9)
  })
})

// TRG 300, annex 1 (repealed), for metal packs: kg/L.
describe('the filling ratios of TRG 300', () => {
  it.each([['R-12', 1.12], ['R-114', 1.29], ['R-227ea', 1.2]])('give %s %d kg/L, which our limit stays under and our ratio meets within 3 percent', (refrigerant, printed) => {
    expect(limitOf(refrigerant).exactLimitGrams).toBeLessThanOrEqual(printed * 1000)
    expect(Math.abs(ratio(refrigerant) / printed - 1)).toBeLessThanOrEqual(0.03)
  })
})
