import { describe, expect, it } from 'vitest'
import { labelSheetPdf } from '../../../server/utils/pdf/labelSheetPdf'
import { PAPER_MM, paperPages, type Paper } from '../../../utils/document/paper'
import { fonts } from '../../helpers/labelPdf'
import { pdfTexts } from '../../helpers/pdfText'
import { drawnPages } from '../../helpers/pdfShapes'

const print = (paper: Paper) => labelSheetPdf({ page: PAPER_MM, pages: paperPages(paper).map(label => [{ position: 1, x: 0, y: 0, symbol: null, label }]) }, fonts)

describe('a printed paper', () => {
  it('comes on letter paper, its text to be read and searched in the file, page after page', async () => {
    const pdf = await print({ sender: ['Quillfen Cooling'], foot: 'A paper', blocks: Array.from({ length: 90 }, (_, index) => ({ kind: 'item' as const, text: `Point ${index + 1}: café, 125 °F` })) })
    const pages = pdfTexts(pdf)
    expect(drawnPages(pdf).map(({ width, height }) => [Math.round(width), Math.round(height)])).toEqual(pages.map(() => [612, 792]))
    expect(pages.length).toBeGreaterThan(1)
    pages.forEach((text, index) => expect(text).toContain(`Page ${index + 1} of ${pages.length}`))
    expect(pages.join('\n')).toContain('Point 90: café, 125 °F')
    expect(pages.join('\n')).not.toContain('\uFFFD')
  })

  it('brings its fonts along, whatever the reader has', async () => {
    const source = (await print({ sender: ['A'], foot: 'B', blocks: [] })).toString('latin1')
    expect(source).toMatch(/\/FontFile[23]? \d+ 0 R/)
    expect(source).not.toMatch(/\/BaseFont \/(Helvetica|Times)/)
  })
})
