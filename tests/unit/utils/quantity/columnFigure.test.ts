import { describe, expect, it } from 'vitest'
import { columnFigure, columnUnit, signedColumnFigure } from '../../../../utils/quantity/columnFigure'

const plain = (text: string) => text.replaceAll('\u00A0', ' ')

describe('a mass in a column', () => {
  it('is a dash where it is not known, and a figure where it is nothing', () => {
    expect(columnFigure(null, 'lb', 'nearest')).toBe('–')
    expect(columnFigure(0, 'lb', 'nearest')).toBe('0.0')
  })

  it('goes without its unit, which the head names', () => {
    expect(columnUnit('lb')).toBe('lb')
    expect(columnFigure(29_960, 'lb', 'down')).toBe('66.0')
    expect(columnFigure(29_960, 'kg', 'down')).toBe('29.96')
  })

  it('keeps pounds under pounds and ounces under ounces', () => {
    expect(columnUnit('lb-oz')).toBe('lb oz')
    expect(plain(columnFigure(29_960, 'lb-oz', 'down'))).toBe('66 lb  0 oz')
    expect(plain(columnFigure(340, 'lb-oz', 'nearest'))).toBe('0 lb 12 oz')
    expect(plain(columnFigure(-340, 'lb-oz', 'nearest'))).toBe('−0 lb 12 oz')
    expect(plain(columnFigure(-539, 'lb-oz', 'nearest'))).toBe('−1 lb  3 oz')
  })

  it('shows a gain with a plus, a loss with a minus, and nothing before what rounds to nothing', () => {
    expect(signedColumnFigure(2812, 'lb')).toBe('+6.2')
    expect(signedColumnFigure(-2812, 'lb')).toBe('−6.2')
    expect(signedColumnFigure(10, 'lb')).toBe('0.0')
    expect(plain(signedColumnFigure(340, 'lb-oz'))).toBe('+0 lb 12 oz')
  })
})
