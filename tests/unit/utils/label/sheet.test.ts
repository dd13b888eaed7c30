import { describe, expect, it } from 'vitest'
import { identityLabel, type IdentityLabel } from '../../../../utils/label/identityLabel'
import { sheet } from '../../../../utils/label/sheet'
import { offsetsFor, usualPrinter } from '../../../../utils/label/printer'
import { isLabelStockId, labelOrigin, LABEL_STOCKS, labelsPerPage, type LabelStock } from '../../../../utils/label/stock'

const letter = LABEL_STOCKS['letter-10']
const roll = LABEL_STOCKS['roll-4x2']

function label(code: string, stock: LabelStock): IdentityLabel {
  return identityLabel({
    code, payload: `HTTPS://CYLINDERS.EXAMPLE/C/${code}`, owner: 'Acme Cooling', telephone: null, copy: 1, stamp: null,
  }, { stock, dotsPerInch: stock.dotsPerInch, diameterMm: null })
}

function many(count: number, stock: LabelStock): IdentityLabel[] {
  return Array.from({ length: count }, () => label('7K3M9Q2TX', stock))
}

describe('label stock', () => {
  it.each([
    ['roll-4x2', 1], ['roll-4x6', 1], ['roll-3x2', 1], ['roll-2x1', 1], ['letter-30', 30], ['letter-10', 10], ['letter-6', 6], ['a4-21', 21], ['a4-14', 14], ['a4-8', 8],
  ] as const)('%s has %d labels a page', (id, count) => {
    expect(labelsPerPage(LABEL_STOCKS[id])).toBe(count)
    expect(LABEL_STOCKS[id].id).toBe(id)
  })

  it.each(Object.values(LABEL_STOCKS))('$id fills its page with the same margin left and right, above and below, and no label over another', (stock) => {
    const last = labelOrigin(stock, labelsPerPage(stock))
    // The A4 sheet of 21 falls 0.1 mm short of the page's width.
    expect(Math.abs(stock.page.width - last.x - stock.label.width - stock.margin.left)).toBeLessThan(0.11)
    expect(stock.page.height - last.y - stock.label.height).toBeCloseTo(stock.margin.top, 2)
    expect(stock.pitch.x).toBeGreaterThanOrEqual(stock.label.width)
    expect(stock.pitch.y).toBeGreaterThanOrEqual(stock.label.height)
  })

  it('lets a print be moved as far as nothing leaves the page, in half millimetres', () => {
    // 2 mm are free in each label; the Letter sheet has 3.969 mm more at its side.
    expect(offsetsFor(roll)).toEqual([-2, -1.5, -1, -0.5, 0, 0.5, 1, 1.5, 2])
    expect(offsetsFor(letter).at(-1)).toBe(5.5)
    expect(offsetsFor(letter).at(0)).toBe(-5.5)
  })

  it('counts labels along the rows', () => {
    expect(labelOrigin(letter, 1)).toEqual({ x: 3.969, y: 12.7 })
    expect(labelOrigin(letter, 2)).toEqual({ x: 110.332, y: 12.7 })
    expect(labelOrigin(letter, 3)).toEqual({ x: 3.969, y: 63.5 })
    expect(labelOrigin(letter, 10).y).toBeCloseTo(215.9, 9)
  })

  it('has no label 0, 11 or 1.5', () => {
    for (const position of [0, 11, 1.5]) expect(() => labelOrigin(letter, position)).toThrow(RangeError)
  })

  it('is known by its name only', () => {
    expect(isLabelStockId('letter-10')).toBe(true)
    expect(isLabelStockId('toString')).toBe(false)
  })
})

describe('laying out labels', () => {
  it('gives each label of a roll its page', () => {
    const { page, pages } = sheet(many(3, roll), roll)
    expect(page).toEqual({ width: 101.6, height: 50.8 })
    expect(pages.map(placed => placed.length)).toEqual([1, 1, 1])
  })

  it('begins on a part-used sheet at its first free label and goes on at the top of the next', () => {
    const { pages } = sheet(many(4, letter), letter, 9)
    expect(pages.map(page => page.map(({ position }) => position))).toEqual([[9, 10], [1, 2]])
    expect(pages[0]![0]).toMatchObject({ x: 3.969, y: 12.7 + 4 * 50.8 })
  })

  it('fills a sheet with ten and begins another with the eleventh', () => {
    expect(sheet(many(10, letter), letter).pages).toHaveLength(1)
    expect(sheet(many(11, letter), letter).pages.map(page => page.length)).toEqual([10, 1])
  })

  it('keeps the order of the labels', () => {
    const codes = ['7K3M9Q2TX', '10100000E']
    const { pages } = sheet(codes.map(code => label(code, letter)), letter, 10)
    expect(pages.flat().map(placed => placed.label.code)).toEqual(codes)
  })

  it('puts every symbol on whole dots of the printer, at most half a dot from its place', () => {
    const dot = 25.4 / 300
    const moved = { ...usualPrinter(letter), offset: { x: 1.5, y: -0.5 } }
    for (const placed of [...sheet(many(10, letter), letter).pages[0]!, ...sheet(many(10, letter), letter, 1, moved).pages[0]!]) {
      for (const [snapped, exact] of [[placed.symbol!.x, placed.x + placed.label.qr.x], [placed.symbol!.y, placed.y + placed.label.qr.y]] as const) {
        expect(snapped / dot).toBeCloseTo(Math.round(snapped / dot), 6)
        expect(Math.abs(snapped - exact)).toBeLessThanOrEqual(dot / 2 + 1e-9)
      }
    }
  })

  it('moves everything by the printer\'s offset', () => {
    const placed = sheet(many(1, roll), roll, 1, { dotsPerInch: 203.2, offset: { x: 1.5, y: -0.5 } }).pages[0]![0]!
    const still = sheet(many(1, roll), roll).pages[0]![0]!
    expect([placed.x, placed.y]).toEqual([1.5, -0.5])
    expect(placed.symbol!.x - still.symbol!.x).toBeCloseTo(1.5, 9)
    expect(placed.symbol!.y - still.symbol!.y).toBeCloseTo(-0.5, 9)
  })

  it('has no start outside the sheet', () => {
    expect(() => sheet(many(1, letter), letter, 11)).toThrow(RangeError)
    expect(() => sheet([], letter, 0)).toThrow(RangeError)
  })
})
