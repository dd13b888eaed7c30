import { describe, expect, it } from 'vitest'
import { filled, kg, registered, viewAfter, VIEW_CONTEXT, STAMP } from '~~/tests/helpers/custody'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'

// WC 20 kg: 20 / 0.99904 = 20.01922 L.
function holding(refrigerant: string, grossKg: number) {
  return viewAfter([registered(), filled(refrigerant, grossKg)]).capacity
}

describe('a filled cylinder at 131 F', () => {
  it('is liquid by the share that its weight asks for', () => {
    // 10,000 g / 20.01922 L = 499.52 kg/m3; (499.52 - 97.9) / (1057.2 - 97.9) = 0.41866.
    expect(holding('R-22', 22).hotLiquidShare).toBeCloseTo(0.41866, 5)
  })

  it('is liquid alone where it would burst, and vapour alone where there is next to nothing in it', () => {
    // R-410A: 20.01922 L x 865.5 = 17,326.6 g fill it.
    expect(holding('R-410A', 29.33).hotLiquidShare).toBe(1)
    expect(holding('R-410A', 29.32).hotLiquidShare).toBeLessThan(1)
    // R-410A: 20.01922 L x 167.0 = 3,343.2 g are all vapour.
    expect(holding('R-410A', 15.34).hotLiquidShare).toBe(0)
    expect(holding('R-410A', 15.35).hotLiquidShare).toBeGreaterThan(0)
  })

  it('that has nothing in it is spoken of as filled to its limit', () => {
    // R-22 at 16,000 g: 799.23 kg/m3; (799.23 - 97.9) / 959.3 = 0.73109.
    const empty = viewAfter([registered()], { askedRefrigerant: 'R-22' }).capacity
    expect(empty.hotLiquidShare).toBeCloseTo(0.73109, 5)
    expect(empty.liquidFull).toEqual({ aboveC: 70 })
  })

  it('is not known of a gas, of unknown contents or without a weight', () => {
    expect(holding('R-744', 20).hotLiquidShare).toBeNull()
    expect(viewAfter([registered()]).capacity).toMatchObject({ hotLiquidShare: null, liquidFull: null })
    expect(viewAfter([registered({ contents: { refrigerant: 'R-22', condition: 'clean' } })]).capacity).toMatchObject({ hotLiquidShare: null, liquidFull: null })
    expect(viewAfter([registered({ contents: { refrigerant: 'R-22', condition: 'mixed' }, gross: kg(22) })]).capacity.hotLiquidShare).toBeNull()
  })
})

describe('a liquid-full cylinder', () => {
  it('is one whose liquid leaves no vapour, at the temperature at which it does', () => {
    // R-410A: 17,326.6 g are liquid-full at 55 C.
    expect(holding('R-410A', 29.3266).liquidFull).toEqual({ c: expect.closeTo(55, 1) })
    expect(holding('R-410A', 13).liquidFull).toEqual({ never: true })
  })
})

describe('a cylinder of a blend that is known by its composition alone', () => {
  it('has a limit to judge an overfill by, but nothing may be put in: its pressure is not known', () => {
    const { fillLimitGrams, stopWeightGrams, roomGrams, refusals, hotLiquidShare, liquidFull } = holding('R-407D', 20)
    // 80 % of 20 kg of water is 16,000 g; 20.01922 L x 956.304 x 0.95 is more.
    expect(fillLimitGrams).toBe(16_000)
    expect(refusals.map(({ code }) => code)).toEqual(['pressure-class'])
    expect(refusals[0]?.text).toBe('No pressure is known for R-407D.')
    expect({ stopWeightGrams, roomGrams, hotLiquidShare, liquidFull }).toEqual({ stopWeightGrams: null, roomGrams: null, hotLiquidShare: null, liquidFull: null })
  })

  it('is overfilled above that limit', () => {
    const codes = (grossKg: number) => viewAfter([registered(), filled('R-407D', grossKg)]).findings.map(({ code }) => code)
    expect(codes(28)).not.toContain('overfill')
    expect(codes(28.1)).toContain('overfill')
  })
})

describe('the filling ratio, where the firm has chosen it', () => {
  const policyNow = { ...DEFAULT_FILL_POLICY, options: { liquid130F: false, unRatio: true } }

  it('leaves no plan to fill R-428A, for which there is none', () => {
    const asked = (policy: typeof policyNow) =>
      viewAfter([registered({ stamp: { ...STAMP, servicePressurePsig: 500 } })], { ...VIEW_CONTEXT, policyNow: policy, askedRefrigerant: 'R-428A' })
    expect(asked(DEFAULT_FILL_POLICY).capacity.stopWeightGrams).not.toBeNull()
    expect(asked(policyNow).capacity).toMatchObject({ fillLimitGrams: null, stopWeightGrams: null, roomGrams: null })
    expect(asked(policyNow).may).not.toContain('filled')
  })

  it('takes the 0.87 kg/L that are printed for R-125, for which it could not be computed', () => {
    // 20.01922 L x 0.87 = 17,416.7 g; 80 % of the water, 16,000 g, is less and governs.
    const { capacity } = viewAfter([registered({ stamp: { ...STAMP, servicePressurePsig: 500 } })], { policyNow, askedRefrigerant: 'R-125' })
    expect(capacity.terms.find(({ rule }) => rule === 'un-ratio')).toMatchObject({ limitGrams: 17_416, standing: 'in-force' })
    expect(capacity.governingRule).toBe('water-weight')
  })
})

describe('the terms of a capacity', () => {
  it('carry their sum in words beside their factors', () => {
    const sums = holding('R-22', 22).terms.map(({ rule, working }) => [rule, working.replaceAll('\u00A0', ' ')])
    expect(sums).toContainEqual(['water-weight', '0.80 × WC 20.00 kg = 16.00 kg'])
    expect(sums).toHaveLength(8)
  })
})
