import { describe, expect, it } from 'vitest'
import { creditWord, differenceWord } from '../../../../utils/settlement/differenceWord'
import { weightsInGrams } from '../../../../utils/settlement/fourWeights'

describe('what is said of a reclaimer’s weights', () => {
  const sent = { grossGrams: 30_000, netGrams: 17_000 }

  it('is nothing where it reported no weight: that is not agreement', () => {
    expect(differenceWord(weightsInGrams(sent, { theirGrossGrams: null, acceptedNetGrams: null }), 'kg')).toBeNull()
    expect(differenceWord(weightsInGrams({ ...sent, netGrams: null }, { theirGrossGrams: null, acceptedNetGrams: 17_000 }), 'kg')).toBeNull()
  })

  it('is that they agree within both scales, or by how much they do not', () => {
    // Half a percent of 30,000 g is 150 g, and of 30,300 g 151.5 g, so 152: 302 g together.
    expect(differenceWord(weightsInGrams(sent, { theirGrossGrams: 30_300, acceptedNetGrams: null }), 'kg')).toEqual({ agrees: true, text: 'within both scales' })
    expect(differenceWord(weightsInGrams(sent, { theirGrossGrams: 30_000, acceptedNetGrams: 16_600 }), 'kg')).toEqual({ agrees: false, text: 'net \u22120.40\u00A0kg' })
  })
})

it('a credit is spoken of only where the statement has another', () => {
  expect([creditWord(null), creditWord(0), creditWord(-150), creditWord(5)]).toEqual(['', '', 'statement \u2212$1.50', 'statement +$0.05'])
})
