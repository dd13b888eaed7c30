import { describe, expect, it } from 'vitest'
import { labelSheetPdf } from '../../../server/utils/pdf/labelSheetPdf'
import { fonts, labelPdf, payloadOf, STAMP } from '../../helpers/labelPdf'
import { boundsOf, drawnPages, isInside, symbolsOf, type DrawnPage } from '../../helpers/pdfShapes'
import { readSymbols } from '../../helpers/readSymbols'

const CODES = ['7K3M9Q2TX', '10100000E']

const PIXELS_PER_POINT = 1.5

async function readPage(page: DrawnPage): Promise<string[]> {
  const symbols = symbolsOf(page).map(outlines => ({ outlines, bounds: boundsOf(outlines) }))
  const width = Math.round(page.width * PIXELS_PER_POINT)
  const height = Math.round(page.height * PIXELS_PER_POINT)
  return readSymbols(width, height, (column, row) => {
    const [x, y] = [(column + 0.5) / PIXELS_PER_POINT, (row + 0.5) / PIXELS_PER_POINT]
    const here = symbols.find(({ bounds }) => x > bounds.left && x < bounds.right && y > bounds.top && y < bounds.bottom)
    return here && isInside(here.outlines, x, y) ? 0 : 255
  })
}

/** The sizes of a file's texts in millimetres, in the order of drawing. */
function textSizes(pdf: Buffer): number[] {
  return [...pdf.toString('latin1').matchAll(/\/F\d+ ([\d.]+) Tf/g)].map(([, size]) => Number(size))
}

describe('printed labels', () => {
  it('come on pages of exactly 288 x 144 points from the roll, one a label', async () => {
    const pages = drawnPages(await labelPdf(CODES, 'roll-4x2'))
    expect(pages.map(({ width, height }) => [width, height])).toEqual([[288, 144], [288, 144]])
  })

  it('come on pages of exactly 612 x 792 points as a Letter sheet, ten a page', async () => {
    const pages = drawnPages(await labelPdf(Array.from({ length: 11 }, () => '7K3M9Q2TX'), 'letter-10'))
    expect(pages.map(({ width, height }) => [width, height])).toEqual([[612, 792], [612, 792]])
    expect(pages.map(page => symbolsOf(page).length)).toEqual([10, 1])
  })

  it.each([['roll-4x2', 203.2], ['letter-10', 600]] as const)('draw every module edge of %s on a whole dot at %d dpi', async (stockId, dotsPerInch) => {
    const [page] = drawnPages(await labelPdf(CODES, stockId))
    const edges = symbolsOf(page!).flat(2).flatMap(({ x, y }) => [x, y]).map(points => points / 72 * dotsPerInch)
    expect(edges.length).toBeGreaterThan(1000)
    for (const dots of edges) expect(Math.abs(dots - Math.round(dots))).toBeLessThan(0.01)
  })

  it('draw the symbol 29 mm wide on the roll', async () => {
    const [page] = drawnPages(await labelPdf(['7K3M9Q2TX'], 'roll-4x2'))
    const { left, right, top, bottom } = boundsOf(symbolsOf(page!)[0]!)
    expect((right - left) / 72 * 25.4).toBeCloseTo(29, 3)
    expect((bottom - top) / 72 * 25.4).toBeCloseTo(29, 3)
  })

  it('are read by the decoder of the scan screen, each page its code', async () => {
    const pages = drawnPages(await labelPdf(CODES, 'roll-4x2'))
    expect(await Promise.all(pages.map(readPage))).toEqual([[payloadOf('7K3M9Q2TX')], [payloadOf('10100000E')]])
  })

  it('are read on a Letter sheet that begins at its ninth label', async () => {
    const [page] = drawnPages(await labelPdf(CODES, 'letter-10', { start: 9 }))
    expect(symbolsOf(page!).every(symbol => boundsOf(symbol).top > 792 * 0.7)).toBe(true)
    expect(await readPage(page!)).toEqual([payloadOf('10100000E'), payloadOf('7K3M9Q2TX')])
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
