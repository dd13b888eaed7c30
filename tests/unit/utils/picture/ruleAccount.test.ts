import { describe, expect, it } from 'vitest'
import type { FillTerm } from '~~/utils/capacity/types'
import { alignDecimals, ruleAccount, standingWords } from '~~/utils/picture/ruleAccount'

const PAD = '\u2007'

// 0.80 x 47.7 lb = 38.16 lb = 17,309.08 g.
const WATER: FillTerm = {
  rule: 'water-weight', limitGrams: 17_309, standing: 'in-force', source: 'a guideline',
  factors: [{ name: 'share', value: 0.8, unit: '' }, { name: 'water-capacity', value: 47.7, unit: 'lb', note: 'as stamped' }],
}
// 0.95 x 20 L x 0.9 kg/L = 17.10 kg = 37.69947 lb, which a scale shows as 37.7: half a gram is the noise of conversion.
const CEILING: FillTerm = {
  rule: 'hot-ceiling', limitGrams: 17_100, standing: 'in-force', source: 'a rule; density: an equation',
  factors: [
    { name: 'share', value: 0.95, unit: '' }, { name: 'volume', value: 20, unit: 'L' },
    { name: 'liquid-density', value: 0.9, unit: 'kg/L', atC: 55, source: 'an equation' },
  ],
}

describe('a rule as an account', () => {
  it('has its factors one under the other, then their product, then what a scale shows', () => {
    const { lines } = ruleAccount(WATER, 'water-weight', 'lb')
    expect(lines.map(({ sign, words, figure, unit }) => [sign, words, figure, unit])).toEqual([
      ['', 'share', '0.80', ''],
      ['×', 'water capacity, WC', `47.7${PAD}`, 'lb'],
      ['=', 'together', '38.16', 'lb'],
      ['', 'rounded down', `38.1${PAD}`, 'lb'],
    ])
  })

  it('goes over to the reader\'s unit where the sum is in another one', () => {
    const { lines } = ruleAccount(CEILING, 'water-weight', 'lb')
    expect(lines.slice(3).map(({ words, figure, unit }) => [words, figure.trim().replaceAll(PAD, ''), unit])).toEqual([
      ['together', '17.10', 'kg'], ['in lb', '37.70', 'lb'], ['rounded down', '37.7', 'lb'],
    ])
    expect(ruleAccount(CEILING, null, 'kg').lines.map(({ words }) => words)).not.toContain('in kg')
  })

  it('names the temperature of a density, and a source only where it does not stand below', () => {
    expect(ruleAccount(CEILING, null, 'lb').lines[2]!.note).toBe('at 131\u00A0°F')
    const elsewhere = { ...CEILING, source: 'a rule' }
    expect(ruleAccount(elsewhere, null, 'lb').lines[2]!.note).toBe('at 131\u00A0°F, an equation')
  })

  it('shows no figure and no product of an unsafe rule', () => {
    const account = ruleAccount({ ...WATER, limitGrams: null, because: 'liquid-full below 131 °F', standing: 'unsafe' }, null, 'lb')
    expect(account.limit).toBeNull()
    expect(account.lines.map(({ words }) => words)).toEqual(['share', 'water capacity, WC'])
    expect(account.standing).toEqual({ text: 'unsafe for this refrigerant', kind: 'stop' })
  })

  it('takes a percent as hundredths: 68 % of 50 kg is 34 kg', () => {
    const { lines } = ruleAccount({
      rule: 'filling-density', limitGrams: 34_000, standing: 'in-force', source: '',
      factors: [{ name: 'filling-density', value: 68, unit: '%' }, { name: 'water-capacity', value: 50, unit: 'kg' }],
    }, null, 'kg')
    expect(lines[2]!.figure).toBe('34.00')
  })
})

describe('how a rule stands', () => {
  it.each([
    [{ standing: 'in-force' as const }, null],
    [{ standing: 'above-margin' as const }, 'above our margin'],
    [{ rule: 'liquid-130F' as const, standing: 'compared' as const }, 'not in force: option off'],
    [{ rule: 'un-ratio' as const, standing: 'compared' as const }, 'not in force: option off'],
    [{ rule: 'oily' as const, standing: 'compared' as const }, 'not in force: only when burnt'],
    [{ standing: 'in-force' as const, limitGrams: null }, 'no figure'],
  ])('%o', (part, text) => {
    expect(standingWords({ ...WATER, ...part })?.text ?? null).toBe(text)
  })
})

describe('figures in a column', () => {
  it('stand with their points under one another, whole ones before the point', () => {
    expect(alignDecimals(['0.8', '47.69', '68'])).toEqual([`0.8${PAD}`, '47.69', `68${PAD}${PAD}${PAD}`])
  })

  it('of pounds and ounces stay as they are', () => {
    expect(alignDecimals(['0.80', '38\u00A0lb\u00A02'])).toEqual(['0.80', '38\u00A0lb\u00A02'])
  })
})
