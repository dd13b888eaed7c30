import { describe, expect, it } from 'vitest'
import { mixingCost, type MixedLine } from '../../../../utils/settlement/mixingCost'

const LINE: MixedLine = {
  cylinderId: 'a', shipmentId: 's', acceptedNet: { unit: 'lb', value: 20 }, rate: { mills: -1_500, per: 'lb' },
  wentIn: [{ refrigerant: 'R-22', cleanRate: { mills: 4_000, per: 'lb' } }, { refrigerant: 'R-410A', cleanRate: { mills: 3_000, per: 'kg' } }],
}

describe('what mixing cost', () => {
  it('is what the best of it would have been credited clean, and the charge besides', () => {
    // 20 x 4.00 = 80.00; charged 20 x 1.50 = 30.00.
    expect(mixingCost([LINE])).toMatchObject({ costCents: 11_000, unknownLines: 0, lines: [{ creditedCents: -3_000, best: { refrigerant: 'R-22', cents: 8_000 } }] })
  })

  it('is only the difference where mixed contents were credited too', () => {
    expect(mixingCost([{ ...LINE, rate: { mills: 1_000, per: 'lb' } }]).costCents).toBe(6_000)
  })

  it('is not known without a net, a price, or a price of anything that went in; and is then counted and not summed', () => {
    const nobodyKnows = [{ ...LINE, acceptedNet: null }, { ...LINE, rate: null }, { ...LINE, wentIn: [] }, { ...LINE, wentIn: [{ refrigerant: 'R-22', cleanRate: null }] }]
    expect(mixingCost([LINE, ...nobodyKnows])).toMatchObject({ costCents: 11_000, unknownLines: 4 })
  })
})
