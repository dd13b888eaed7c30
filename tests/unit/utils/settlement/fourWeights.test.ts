import { describe, expect, it } from 'vitest'
import { fourWeights } from '../../../../utils/settlement/fourWeights'

// 40 lb = 18143.7 g. A scale that nobody named is good to 0.5 % of its reading or half an ounce (14.2 g), whichever is more.
const SENT = { grossGrams: 18_144, netGrams: 5_670, refrigerant: 'R-22', condition: 'clean' }

describe('the four weights of a line', () => {
  it('stand side by side, theirs rounded to the gram', () => {
    expect(fourWeights(SENT, { theirGross: { unit: 'lb', value: 40 }, acceptedNet: { unit: 'lb', value: 12 } })).toMatchObject({
      ourGrossGrams: 18_144, ourNetGrams: 5_670, theirGrossGrams: 18_144, acceptedNetGrams: 5_443, gross: { grams: 0, isBeyond: false }, net: { grams: -227 },
    })
  })

  it('agree up to what both scales may be off, and not a gram further', () => {
    // Ours: 0.5 % of 18,144 = 90.7, so 91. Theirs at 17,963: 89.8, so 90. Together 181.
    expect(fourWeights(SENT, { theirGross: { unit: 'kg', value: 17.963 }, acceptedNet: null }).gross).toEqual({ grams: -181, accuracyGrams: 181, isBeyond: false })
    expect(fourWeights(SENT, { theirGross: { unit: 'kg', value: 17.962 }, acceptedNet: null }).gross).toEqual({ grams: -182, accuracyGrams: 181, isBeyond: true })
  })

  it('hold a net against the accuracy of the gross weights it came from', () => {
    // With no gross of theirs both scales stand at our gross: 91 + 91.
    expect(fourWeights(SENT, { theirGross: null, acceptedNet: { unit: 'kg', value: 5.488 } }).net).toEqual({ grams: -182, accuracyGrams: 182, isBeyond: false })
    expect(fourWeights(SENT, { theirGross: null, acceptedNet: { unit: 'kg', value: 5.487 } }).net).toEqual({ grams: -183, accuracyGrams: 182, isBeyond: true })
  })

  it('use the accuracy of our own scale where it is known', () => {
    const scale = { id: 's', name: 'Bench', accuracyGrams: 20, accuracyPercent: 0, lastCheck: null }
    // 20 + 90 = 110.
    expect(fourWeights(SENT, { theirGross: { unit: 'kg', value: 18 }, acceptedNet: null }, scale).gross).toMatchObject({ accuracyGrams: 110, isBeyond: true })
  })

  it('stay unknown where one is, and take nothing for a weight of nothing', () => {
    expect(fourWeights({ ...SENT, netGrams: null }, { theirGross: null, acceptedNet: { unit: 'lb', value: 0 } })).toMatchObject({ ourNetGrams: null, acceptedNetGrams: 0, gross: null, net: null })
    expect(fourWeights(SENT, { theirGross: null, acceptedNet: { unit: 'lb', value: 0 } }).net).toMatchObject({ grams: -5_670, isBeyond: true })
    expect(fourWeights(null, { theirGross: { unit: 'lb', value: 40 }, acceptedNet: null })).toMatchObject({ ourGrossGrams: null, theirGrossGrams: 18_144, gross: null })
  })
})
