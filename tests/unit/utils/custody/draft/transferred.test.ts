import { describe, expect, it } from 'vitest'
import { CUSTOMER, filled, kg, OTHER_CYLINDER, registered, viewAfter } from '~~/tests/helpers/custody'
import { emptyTransfer, readTransfer, transferBalance, type TransferDraft } from '~~/utils/custody/draft/transferred'

const full = viewAfter([registered(), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER })])
const other = { ...viewAfter([registered()]), id: OTHER_CYLINDER }
const draft: TransferDraft = { ...emptyTransfer(full, 'pair'), outBefore: kg(20), outAfter: kg(15), inBefore: kg(12), inAfter: kg(17) }

describe('the form of a transfer', () => {
  it('begins out of a cylinder that holds something, and into one that holds nothing', () => {
    expect(emptyTransfer(full, 'pair').gives).toBe(true)
    expect(emptyTransfer(other, 'pair').gives).toBe(false)
  })

  it('says on both halves what the log says of the one that gives', () => {
    const both = { transferId: 'pair', refrigerant: 'R-22', condition: 'clean', ownerOfRefrigerantId: CUSTOMER }
    expect(readTransfer(draft, full, other)).toEqual({
      out: { ...both, direction: 'out', counterpartId: OTHER_CYLINDER, grossBefore: kg(20), grossAfter: kg(15) },
      in: { ...both, direction: 'in', counterpartId: full.id, grossBefore: kg(12), grossAfter: kg(17) },
    })
  })

  it('names nothing that comes out of a cylinder which should hold nothing', () => {
    expect(readTransfer(draft, other, full)).toMatchObject({ out: { refrigerant: null, condition: 'unknown' }, in: { refrigerant: null, condition: 'unknown' } })
  })

  it('says what it still lacks', () => {
    expect(readTransfer(draft, full, null)).toEqual({ reason: 'Scan or choose the other cylinder.' })
    expect(readTransfer(draft, full, full)).toHaveProperty('reason')
    expect(readTransfer({ ...draft, outAfter: null }, full, other)).toHaveProperty('reason')
    expect(readTransfer({ ...draft, inAfter: null }, full, other)).toHaveProperty('reason')
    expect(readTransfer({ ...draft, outBefore: null, inBefore: null }, full, other)).not.toHaveProperty('reason')
  })

  it('balances within the accuracies of the four readings', () => {
    // 0.5 % of 20, 15 and 12 kg, and of what the last reads: 100 + 75 + 60 + 85 g at 17 kg.
    expect(transferBalance(draft)).toEqual({ outGrams: 5000, inGrams: 5000, withinGrams: 320, balances: true })
    // At 16.681 kg the last is good to 84 g: 319 g apart, 319 g explained.
    expect(transferBalance({ ...draft, inAfter: kg(16.681) })).toMatchObject({ inGrams: 4681, withinGrams: 319, balances: true })
    expect(transferBalance({ ...draft, inAfter: kg(16.68) })).toMatchObject({ inGrams: 4680, withinGrams: 319, balances: false })
    expect(transferBalance({ ...draft, inBefore: null })).toBeNull()
  })
})
