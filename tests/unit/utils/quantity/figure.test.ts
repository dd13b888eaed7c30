import { describe, expect, it } from 'vitest'
import { parseFigure, parseSignedFigure } from '~~/utils/quantity/figure'

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

describe('a figure that may lie below zero', () => {
  it('takes one minus before it, of either sort, and otherwise what any figure takes', () => {
    expect(parseSignedFigure('-4.9')).toEqual({ value: -4.9 })
    expect(parseSignedFigure(' \u22124,9 ')).toEqual({ value: -4.9 })
    expect(parseSignedFigure('80')).toEqual({ value: 80 })
    expect(parseSignedFigure('-0')).toEqual({ value: 0 })
  })

  it('is none without a figure behind the minus, or with two', () => {
    expect(parseSignedFigure('')).toEqual({ error: 'empty' })
    for (const text of ['-', '--4', '+4', '4-']) expect(parseSignedFigure(text), text).toEqual({ error: 'not-a-number' })
    expect(parseSignedFigure('-1,022')).toEqual({ error: 'ambiguous' })
  })
})
