import { describe, expect, it } from 'vitest'
import { labelSheetPdf } from '../../../server/utils/pdf/labelSheetPdf'
import { PAPER_MM, paperPages, type Paper } from '../../../utils/document/paper'
import { forPrint, unprintable } from '../../../utils/label/printable'
import type { LabelFace } from '../../../utils/label/drawing'
import { fonts } from '../../helpers/labelPdf'
import { drawnGlyphs, pageContents, pdfTexts } from '../../helpers/pdfText'
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

describe('names that are not written in plain Latin letters', () => {
  /** How often a page draws the first glyph of a font: the empty box. */
  const boxes = (pdf: Buffer) => drawnGlyphs(pdf).filter(glyph => glyph === '0000').length
  const print = (texts: string[], face: LabelFace) => labelSheetPdf({ page: PAPER_MM, pages: [[{ position: 1, x: 0, y: 0, symbol: null, label: {
    width: PAPER_MM.width, height: PAPER_MM.height, qr: null, strokes: [], rules: [],
    texts: texts.map((text, index) => ({ text, face, size: 4, x: 10, y: 10 + index * 5, align: 'left' as const, maxWidth: 190 })),
  } }]] }, fonts)
  const FACES: LabelFace[] = ['figures', 'figures-bold', 'words', 'words-bold']

  it.each(FACES)('are printed letter by letter in %s, each from a font that has it', async (face) => {
    const names = ['Łódź Świeży Řehoř', 'Ağrı Șerban Őrs', 'Ψύξη Αθήνα', 'Київ Холод', 'Құрылыс', 'Điện Lạnh']
    const pdf = await print(names, face)
    expect(boxes(pdf)).toBe(0)
    expect(pdfTexts(pdf).join('').replaceAll('\n', '')).toBe(names.join(''))
  })

  it.each(FACES)('are typed only in letters that %s can print', async (face) => {
    const all = Array.from({ length: 0x2FFF }, (_, code) => String.fromCharCode(code)).filter(letter => letter.trim() !== '' && forPrint(letter) === letter && unprintable(letter).length === 0)
    expect(all.length).toBeGreaterThan(700)
    const pdf = await print(all.flatMap((_, index) => index % 40 === 0 ? [all.slice(index, index + 40).join('')] : []), face)
    expect(boxes(pdf)).toBe(0)
    expect(pdfTexts(pdf).join('')).not.toContain('[U+')
  })

  it('are printed by number where no font has a letter, and never as an empty box', async () => {
    const pdf = await print(['株 Tarn 🧊'], 'words')
    expect(boxes(pdf)).toBe(0)
    expect(pdfTexts(pdf).join('')).toBe('[U+682A] Tarn [U+1F9CA]')
  })

  it('keep their width: what does not fit is set smaller as a whole', async () => {
    const sizes = (pdf: Buffer) => [...pageContents(pdf).join('').matchAll(/\/F\d+ ([\d.]+) Tf/g)].map(([, size]) => Number(size))
    const [size, ...others] = sizes(await print(['Київ Łódź '.repeat(40)], 'words'))
    expect(size).toBeLessThan(4)
    expect(new Set([size, ...others]).size).toBe(1)
  })
})
