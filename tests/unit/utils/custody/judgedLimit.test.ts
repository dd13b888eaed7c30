import { describe, expect, it } from 'vitest'
import { filled, folded, registered } from '~~/tests/helpers/custody'
import { overfillGrams } from '~~/utils/custody/judgedLimit'

describe('the excess of an overfill', () => {
  const { state } = folded(registered(), filled('R-22', 29))

  it('is what is above the limit, and nothing at it', () => {
    expect(overfillGrams(state, 16_000)).toBe(1000)
    expect(overfillGrams(state, 17_000)).toBe(0)
  })

  it('stands without a figure where no limit is known any more, and is none where there never was one', () => {
    expect(overfillGrams(state, null)).toBeNull()
    expect(overfillGrams({ ...state, overfilledAt: null }, null)).toBe(0)
  })
})
