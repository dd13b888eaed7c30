import { describe, expect, it } from 'vitest'
import { labelSheetPdf } from '../../../server/utils/pdf/labelSheetPdf'
import { fonts, labelPdf, payloadOf, STAMP } from '../../helpers/labelPdf'
import { drawLabelCode } from '../../../utils/label/code'
import { offsetsFor, printerChoices } from '../../../utils/label/printer'
import { LABEL_STOCKS, labelsPerPage, type LabelStockId } from '../../../utils/label/stock'
import { boundsOf, drawnPages, symbolsOf } from '../../helpers/pdfShapes'
import { symbolTexts } from '../../helpers/printedPage'

const CODES = ['7K3M9Q2TX', '10100000E']

const STOCKS = Object.keys(LABEL_STOCKS) as LabelStockId[]
const PRINTERS = STOCKS.flatMap(id => printerChoices(LABEL_STOCKS[id]).map(dotsPerInch => [id, dotsPerInch] as const))

/** Sizes in points, worked out by hand: 72 to the inch, 72 / 25.4 to the millimetre. */
const PAGES: Record<LabelStockId, [width: number, height: number]> = {
  'roll-4x2': [288, 144], 'roll-4x6': [288, 432], 'roll-3x2': [216, 144], 'roll-2x1': [144, 72],
  'letter-30': [612, 792], 'letter-10': [612, 792], 'letter-6': [612, 792],
  'a4-21': [595.276, 841.89], 'a4-14': [595.276, 841.89], 'a4-8': [595.276, 841.89],
}

/** The sizes of a file's texts in millimetres, in the order of drawing. */
function textSizes(pdf: Buffer): number[] {
  return [...pdf.toString('latin1').matchAll(/\/F\d+ ([\d.]+) Tf/g)].map(([, size]) => Number(size))
}

describe('printed labels', () => {
  it.each(STOCKS)('come from %s on pages of its exact size, as many a page as it holds', async (stockId) => {
    const perPage = labelsPerPage(LABEL_STOCKS[stockId])
    const pages = drawnPages(await labelPdf(Array.from({ length: perPage + 1 }, () => '7K3M9Q2TX'), stockId))
    for (const { width, height } of pages) {
      expect(width).toBeCloseTo(PAGES[stockId][0], 2)
      expect(height).toBeCloseTo(PAGES[stockId][1], 2)
    }
    expect(pages.map(page => symbolsOf(page).length)).toEqual([perPage, 1])
  })

  it.each(PRINTERS)('draw every module edge of %s on a whole dot at %d dpi, moved by an offset or not', async (stockId, dotsPerInch) => {
    const most = offsetsFor(LABEL_STOCKS[stockId]).at(-1)!
    for (const offset of [{ x: 0, y: 0 }, { x: 0.5, y: -0.5 }, { x: -most, y: most }]) {
      const perPage = labelsPerPage(LABEL_STOCKS[stockId])
      const [page] = drawnPages(await labelPdf(Array.from({ length: perPage }, () => CODES[0]!), stockId, { printer: { dotsPerInch, offset } }))
      const edges = symbolsOf(page!).flat(2).flatMap(({ x, y }) => [x, y]).map(points => points / 72 * dotsPerInch)
      expect(edges.length).toBeGreaterThan(1000 * perPage)
      expect(Math.max(...edges.map(dots => Math.abs(dots - Math.round(dots))))).toBeLessThan(0.01)
      expect(Math.min(...edges)).toBeGreaterThan(0)
    }
  })

  it.each(PRINTERS)('are read off a whole page of %s at %d dpi, every one its own code', async (stockId, dotsPerInch) => {
    let draws = 0
    const codes = Array.from({ length: labelsPerPage(LABEL_STOCKS[stockId]) }, () => drawLabelCode(count => Uint8Array.from({ length: count }, () => draws++ * 37 % 251)))
    expect(new Set(codes).size).toBe(codes.length)
    const [page] = drawnPages(await labelPdf(codes, stockId, { printer: { dotsPerInch, offset: { x: 0, y: 0 } } }))
    expect(await symbolTexts(page!)).toEqual(codes.map(payloadOf).sort())
  })

  it('draw the symbol 29 mm wide on the roll', async () => {
    const [page] = drawnPages(await labelPdf(['7K3M9Q2TX'], 'roll-4x2'))
    const { left, right, top, bottom } = boundsOf(symbolsOf(page!)[0]!)
    expect((right - left) / 72 * 25.4).toBeCloseTo(29, 3)
    expect((bottom - top) / 72 * 25.4).toBeCloseTo(29, 3)
  })

  it('are read on a Letter sheet that begins at its ninth label', async () => {
    const [page] = drawnPages(await labelPdf(CODES, 'letter-10', { start: 9 }))
    expect(symbolsOf(page!).every(symbol => boundsOf(symbol).top > 792 * 0.7)).toBe(true)
    expect(await symbolTexts(page!)).toEqual([payloadOf('10100000E'), payloadOf('7K3M9Q2TX')])
  })

  it('bring their four faces with them, and their title names no code or person', async () => {
    const file = (await labelPdf(['7K3M9Q2TX'], 'roll-4x2', { compress: false })).toString('latin1')
    expect(new Set(file.match(/\/FontName \/\w+\+[\w-]+/g)?.map(name => name.replace(/.*\+/, '')))).toEqual(
      new Set(['RobotoMono-Medium', 'RobotoMono-Bold', 'Barlow-SemiBold', 'Barlow-Bold']))
    expect(file).not.toContain('Helvetica')
    expect(file).toContain('(Cylinder labels)')
    expect(file).not.toMatch(/\/Author|\/Subject|\/Keywords/)
  })

  it('set a serial too long for its column smaller, and cut nothing of it', async () => {
    // 16 characters of 0.6001 em (1229 of 2048 units) into 20.0 mm: a size of 2.083 mm.
    const usual = textSizes(await labelPdf(['7K3M9Q2TX'], 'roll-4x2', { compress: false }))
    const long = textSizes(await labelPdf(['7K3M9Q2TX'], 'roll-4x2', {
      compress: false, changes: { stamp: { ...STAMP, serial: 'K482130000000017' } },
    }))
    const changed = usual.flatMap((size, index) => size === long[index] ? [] : [[size, long[index]]])
    expect(changed).toEqual([[3.9, expect.closeTo(2.083, 3)]])
  })

  it('need at least one label', () => {
    expect(() => labelSheetPdf({ page: { width: 101.6, height: 50.8 }, pages: [] }, fonts)).toThrow(RangeError)
  })
})
