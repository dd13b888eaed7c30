import { describe, expect, it } from 'vitest'
import { NOTHING_SAID, type LineFigures } from '../../../../utils/settlement/figures'
import { pastedBlock, readMass, readMoney, readRate, readTyped, retyped, typedOf } from '../../../../utils/settlement/typedLine'

describe('what is typed of a line', () => {
  it('reads as it was shown, whatever the unit of the screen', () => {
    const figures: LineFigures = {
      theirGross: { unit: 'kg', value: 18.97 }, acceptedNet: { unit: 'lb-oz', lb: 11, oz: 8 }, grade: 'A', rate: { mills: -1_255, per: 'kg' }, statedCents: -1_234, outcome: 'taken-over',
    }
    expect(typedOf(figures, 'lb')).toEqual({ gross: '18.97 kg', net: '11 lb 8 oz', grade: 'A', price: '-1.255/kg', stated: '-12.34', outcome: 'taken-over' })
    expect(readTyped(typedOf(figures, 'lb'), 'lb')).toEqual({ figures })
    expect(readTyped(typedOf(figures, 'kg'), 'kg')).toEqual({ figures })
    expect(readTyped(typedOf(NOTHING_SAID, 'lb'), 'lb')).toEqual({ figures: NOTHING_SAID })
  })

  it('has a weight of nothing, which is not the same as none', () => {
    expect(readMass('0', 'lb')).toEqual({ value: { unit: 'lb', value: 0 } })
    expect(readMass(' ', 'lb')).toEqual({ value: null })
  })

  it('refuses what is no weight, what can be read in two ways, and what no scale shows', () => {
    for (const text of ['heavy', '-1', '1,022', '100001', '12 lb 16 oz', '45001 kg']) expect(readMass(text, 'lb')).toHaveProperty('wrong')
    expect(readMass('100000', 'lb')).toEqual({ value: { unit: 'lb', value: 100_000 } })
  })

  it('takes a price to the thousandth and an amount to the cent', () => {
    expect(readRate('2.4', 'lb')).toEqual({ value: { mills: 2_400, per: 'lb' } })
    expect(readRate('$2.125 a kg', 'lb')).toEqual({ value: { mills: 2_125, per: 'kg' } })
    expect(readRate('−1,50', 'kg')).toEqual({ value: { mills: -1_500, per: 'kg' } })
    expect(readRate('2.1255', 'lb')).toHaveProperty('wrong')
    expect(readMoney('26.40')).toEqual({ value: 2_640 })
    expect(readMoney('26.405')).toHaveProperty('wrong')
  })

  it('says the same where the screen changes its unit, also beside a box that cannot be read', () => {
    expect(retyped({ gross: '39.9', net: 'x', grade: 'A', price: '2.4', stated: '1', outcome: '' }, 'lb', 'kg')).toEqual({ gross: '39.9 lb', net: 'x', grade: 'A', price: '2.40/lb', stated: '1', outcome: '' })
    expect(retyped({ gross: '39.9 lb', net: '', grade: '', price: '2.40/lb', stated: '', outcome: '' }, 'kg', 'lb')).toMatchObject({ gross: '39.9', net: '', price: '2.40' })
  })

  it('tells of every box that is wrong', () => {
    expect(readTyped({ gross: 'x', net: '', grade: 'y'.repeat(81), price: 'z', stated: '1', outcome: '' }, 'lb')).toEqual({
      wrong: { gross: expect.any(String), grade: 'At most 80 letters.', price: expect.any(String) },
    })
  })

  it('comes as a block from a spreadsheet', () => {
    expect(pastedBlock('40.1\t11\tA\r\n39\t10.5 \t\r\n')).toEqual([['40.1', '11', 'A'], ['39', '10.5', '']])
  })
})
