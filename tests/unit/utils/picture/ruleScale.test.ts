import { describe, expect, it } from 'vitest'
import type { FillTerm } from '~~/utils/capacity/types'
import { anySpeaks, governingFirst, layOutRules } from '~~/utils/picture/ruleScale'

function term(rule: FillTerm['rule'], limitGrams: number | null, standing: FillTerm['standing'] = 'in-force', factors: FillTerm['factors'] = []): FillTerm {
  return { rule, limitGrams, standing, factors, source: '' }
}

// Liquid-full at 131 F is 20 L x 1 kg/L = 20 kg; the scale ends a tenth past it, at 22 kg.
const TERMS = [
  term('liquid-77F', null, 'unsafe'),
  term('water-weight', 11_000),
  term('hot-ceiling', 19_000, 'in-force', [
    { name: 'share', value: 0.95, unit: '' }, { name: 'volume', value: 20, unit: 'L' }, { name: 'liquid-density', value: 1, unit: 'kg/L', atC: 55 },
  ]),
]

describe('the rules on one scale', () => {
  it('stand at their limits, the governing one first, liquid-full hatched from its own weight', () => {
    const scale = layOutRules(TERMS, 'water-weight', 'kg')!
    expect(scale.marks.map(({ rule }) => rule)).toEqual(['water-weight', 'liquid-77F', 'hot-ceiling'])
    expect(scale.marks[0]!.at).toBeCloseTo(50, 6)
    expect(scale.liquidFullFrom).toBeCloseTo(20 / 22 * 100, 6)
  })

  it('put no mark where there is no figure, and say so in words', () => {
    const { marks, text } = layOutRules(TERMS, 'water-weight', 'kg')!
    expect(marks[1]).toMatchObject({ at: null, figure: 'unsafe for this refrigerant' })
    expect(text).toBe('water weight 11.00\u00A0kg, governs; liquid at 77 °F unsafe for this refrigerant; the hot ceiling, liquid at 131 °F 19.00\u00A0kg; liquid-full at 131 °F 20.00\u00A0kg')
  })

  it('hatch nothing for a gas', () => {
    expect(layOutRules([term('filling-density', 10_000), term('hot-ceiling', null)], 'filling-density', 'kg')!.liquidFullFrom).toBeNull()
  })

  it('are no picture where no rule has a figure', () => {
    expect(layOutRules([term('water-weight', null)], null, 'kg')).toBeNull()
  })

  it('keep their order behind the one that governs', () => {
    expect(governingFirst(TERMS, 'hot-ceiling').map(({ rule }) => rule)).toEqual(['hot-ceiling', 'liquid-77F', 'water-weight'])
  })

  it('speak where one has a figure or keeps an unsafe one back', () => {
    expect(anySpeaks([term('water-weight', null, 'unsafe')])).toBe(true)
    expect(anySpeaks([term('water-weight', 0)])).toBe(true)
    expect(anySpeaks([term('water-weight', null)])).toBe(false)
  })
})
