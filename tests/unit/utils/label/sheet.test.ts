import { describe, expect, it } from 'vitest'
import { identityLabel, type IdentityLabel } from '../../../../utils/label/identityLabel'
import { sheet } from '../../../../utils/label/sheet'
import { isLabelStockId, labelOrigin, LABEL_STOCKS, labelsPerPage } from '../../../../utils/label/stock'

const letter = LABEL_STOCKS['letter-10']
const roll = LABEL_STOCKS['roll-4x2']

function label(code: string, stock: typeof letter | typeof roll): IdentityLabel {
  return identityLabel({
    code, payload: `HTTPS://CYLINDERS.EXAMPLE/C/${code}`, owner: 'Acme Cooling', telephone: null, copy: 1, stamp: null,
  }, stock)
}

function many(count: number, stock: typeof letter | typeof roll): IdentityLabel[] {
  return Array.from({ length: count }, () => label('7K3M9Q2TX', stock))
}

describe('label stock', () => {
  it('holds one label on the roll and ten on a Letter sheet', () => {
    expect([labelsPerPage(roll), labelsPerPage(letter)]).toEqual([1, 10])
  })

  it('fills the Letter sheet from edge to edge with the same margin left and right, above and below', () => {
    const last = labelOrigin(letter, 10)
    expect(letter.page.width - last.x - letter.label.width).toBeCloseTo(letter.margin.left, 2)
    expect(letter.page.height - last.y - letter.label.height).toBeCloseTo(letter.margin.top, 2)
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
    const dot = 25.4 / 600
    for (const placed of sheet(many(10, letter), letter).pages[0]!) {
      for (const [snapped, exact] of [[placed.qrX, placed.x + placed.label.qr.x], [placed.qrY, placed.y + placed.label.qr.y]] as const) {
        expect(snapped / dot).toBeCloseTo(Math.round(snapped / dot), 6)
        expect(Math.abs(snapped - exact)).toBeLessThanOrEqual(dot / 2 + 1e-9)
      }
    }
  })

  it('has no start outside the sheet', () => {
    expect(() => sheet(many(1, letter), letter, 11)).toThrow(RangeError)
    expect(() => sheet([], letter, 0)).toThrow(RangeError)
  })
})
