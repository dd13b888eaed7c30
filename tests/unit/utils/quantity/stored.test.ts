import { describe, expect, it } from 'vitest'
import { storedText } from '../../../../utils/quantity/stored'

describe('the space that is taken up on a device', () => {
  it.each([
    [{ usedBytes: 3_140_000, quotaBytes: 2_000_000_000 }, '3.1 of 2,000 MB'],
    [{ usedBytes: 12_600_000, quotaBytes: null }, '13 MB'],
    [{ usedBytes: 0, quotaBytes: 9_960_000 }, '0 of 10 MB'],
    [{ usedBytes: null, quotaBytes: 2_000_000_000 }, null],
  ])('of %o is written %s', (told, text) => {
    expect(storedText(told)).toBe(text)
  })
})
