import { describe, expect, it } from 'vitest'
import { adviceLabel } from '~~/utils/document/adviceLabel'
import { LABEL_ADVICE } from '~~/utils/document/labelAdvice'
import { isRoll, LABEL_STOCKS } from '~~/utils/label/stock'

describe('the first label of a roll', () => {
  it.each(Object.values(LABEL_STOCKS).filter(isRoll))('says on $id all that is to be minded, legibly and inside its edges', (stock) => {
    const { texts, width, height } = adviceLabel(stock)
    expect(texts.map(({ text }) => text).join(' ')).toBe(LABEL_ADVICE.join(' '))
    for (const { x, y, size, maxWidth } of texts) {
      expect(size).toBeGreaterThanOrEqual(1.9)
      expect(x + maxWidth).toBeLessThanOrEqual(width - 2)
      expect(y - size * 0.75).toBeGreaterThanOrEqual(2)
      expect(y + size * 0.25).toBeLessThanOrEqual(height - 2)
    }
  })
})
