import { describe, expect, it } from 'vitest'
import { parseFigure } from '~~/utils/quantity/figure'

describe('a typed figure', () => {
  it.each([
    ['41.8', 41.8], ['41,8', 41.8], [' 41.8 ', 41.8], ['0', 0], ['.5', 0.5], [',5', 0.5], ['41.', 41],
    ['1.022', 1.022], ['0,022', 0.022], ['1022', 1022], ['12,3456', 12.3456],
  ])('%j is %d', (text, value) => {
    expect(parseFigure(text)).toEqual({ value })
  })

  it.each(['1,022', '999,000', '1,022.5', '1.022,5', '1,022,000'])('%j can be read in two ways and is refused', (text) => {
    expect(parseFigure(text)).toEqual({ error: 'ambiguous' })
  })

  it.each(['', '   '])('%j is empty', (text) => {
    expect(parseFigure(text)).toEqual({ error: 'empty' })
  })

  it.each(['abc', '-3', '1e3', '12 lb', '.', ',', 'Infinity', '0x10', '1 022'])('%j is not a number', (text) => {
    expect(parseFigure(text)).toEqual({ error: 'not-a-number' })
  })
})
