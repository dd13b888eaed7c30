import { describe, expect, it } from 'vitest'
import { creditCents, formatMoney, formatRate, priceOn, priceSpan, type DatedPrice } from '~~/utils/reclaim/price'

function price(id: string, more: Partial<DatedPrice> = {}): DatedPrice {
  return { id, refrigerant: 'R-22', condition: 'clean', fromDay: '2026-01-01', untilDay: null, rate: { mills: 5000, per: 'lb' }, recordedAt: 0, ...more }
}

const on = (day: string, prices: DatedPrice[], what: { refrigerant: string | null, condition: string } = { refrigerant: 'R-22', condition: 'clean' }) =>
  priceOn(prices, { ...what, day })?.id ?? null

describe('the credit for a mass', () => {
  it('is the rate times the mass, to the nearest cent', () => {
    // 100 lb are 45,359.237 g; 45,359 g are 99.99948 lb, at $5.00 that is $499.9974.
    expect(creditCents({ mills: 5000, per: 'lb' }, 45_359)).toBe(50_000)
    // 1 kg at $5.00 a lb: 2.2046226 lb, $11.02311.
    expect(creditCents({ mills: 5000, per: 'lb' }, 1000)).toBe(1102)
    expect(creditCents({ mills: 5000, per: 'lb' }, 0)).toBe(0)
  })

  it('goes up from the half cent, down below it, away from zero on both sides', () => {
    // At $5.00 a kilogram a gram is half a cent.
    expect(creditCents({ mills: 5000, per: 'kg' }, 1)).toBe(1)
    expect(creditCents({ mills: 4990, per: 'kg' }, 1)).toBe(0)
    expect(creditCents({ mills: -5000, per: 'kg' }, 1)).toBe(-1)
    expect(creditCents({ mills: -4990, per: 'kg' }, 1)).toBe(0)
    expect(creditCents({ mills: 2500, per: 'kg' }, 1_234)).toBe(309)
  })

  it('is exact where a floating point number would not be', () => {
    // 9,007,199 kg at 99,999.999 a kilogram: 900,719,890,992.801, so $900,719,890,992.80.
    expect(creditCents({ mills: 99_999_999, per: 'kg' }, 9_007_199_000)).toBe(90_071_989_099_280)
  })
})

describe('the price on a day', () => {
  it('holds from its first day to its last, both included', () => {
    const spring = price('spring', { fromDay: '2026-03-01', untilDay: '2026-05-31' })
    expect(on('2026-02-28', [spring])).toBeNull()
    expect(on('2026-03-01', [spring])).toBe('spring')
    expect(on('2026-05-31', [spring])).toBe('spring')
    expect(on('2026-06-01', [spring])).toBeNull()
  })

  it('is the one that began last, and what it stood over holds again after its end', () => {
    const always = price('always')
    const june = price('june', { fromDay: '2026-06-01', untilDay: '2026-06-30' })
    expect(on('2026-05-31', [always, june])).toBe('always')
    expect(on('2026-06-01', [always, june])).toBe('june')
    expect(on('2026-07-01', [always, june])).toBe('always')
  })

  it('of two from one day is the one recorded last', () => {
    expect(on('2026-02-01', [price('slip', { recordedAt: 1 }), price('mended', { recordedAt: 2 })])).toBe('mended')
  })

  it('is for one refrigerant in one condition', () => {
    expect(on('2026-02-01', [price('a')], { refrigerant: 'R-134a', condition: 'clean' })).toBeNull()
    expect(on('2026-02-01', [price('a')], { refrigerant: 'R-22', condition: 'suspect' })).toBeNull()
  })

  it('of mixed contents is that of their refrigerant, else that of all mixed ones', () => {
    const all = price('all', { refrigerant: null, condition: 'mixed' })
    const own = price('own', { condition: 'mixed' })
    expect(on('2026-02-01', [all], { refrigerant: 'R-22', condition: 'mixed' })).toBe('all')
    expect(on('2026-02-01', [all, own], { refrigerant: 'R-22', condition: 'mixed' })).toBe('own')
    expect(on('2026-02-01', [all, own], { refrigerant: null, condition: 'mixed' })).toBe('all')
  })

  it('of what nobody has named is never that of a named refrigerant', () => {
    const unknown = price('unknown', { refrigerant: null, condition: 'unknown' })
    expect(on('2026-02-01', [price('a', { condition: 'suspect' }), unknown], { refrigerant: null, condition: 'suspect' })).toBe('unknown')
    expect(on('2026-02-01', [price('a', { condition: 'suspect' })], { refrigerant: null, condition: 'suspect' })).toBeNull()
    expect(on('2026-02-01', [unknown], { refrigerant: 'R-22', condition: 'unknown' })).toBeNull()
  })
})

describe('money and rates in words', () => {
  it('have thousands apart, cents always, and thousandths where there are any', () => {
    expect(formatMoney(0)).toBe('$0.00')
    expect(formatMoney(5)).toBe('$0.05')
    expect(formatMoney(123_456_789)).toBe('$1,234,567.89')
    expect(formatMoney(-123_456)).toBe('−$1,234.56')
    expect(formatRate({ mills: 5250, per: 'lb' })).toBe('$5.25\u00A0a\u00A0lb')
    expect(formatRate({ mills: 2125, per: 'lb' })).toBe('$2.125\u00A0a\u00A0lb')
    expect(formatRate({ mills: -20, per: 'kg' })).toBe('−$0.02\u00A0a\u00A0kg')
    expect(priceSpan({ fromDay: '2026-03-01', untilDay: '2026-05-31' })).toBe('from 1 Mar 2026 to 31 May 2026')
  })
})
