import { objectText, pageIds, streamText } from './pdfShapes'

/** The text of each page of a PDF, one line for each run as it was drawn, read from the file's own fonts. */
export function pdfTexts(pdf: Buffer): string[] {
  const source = pdf.toString('latin1')
  return pageIds(source).map((id) => {
    const page = objectText(source, id)
    const resources = objectText(source, /\/Resources (\d+) 0 R/.exec(page)![1]!)
    const fonts = new Map([...resources.matchAll(/\/(F\d+) (\d+) 0 R/g)].map(([, name, font]) => [name!, lettersOf(source, font!)]))
    return linesOf(contentOf(source, page), fonts).join('\n')
  })
}

/** The drawing of each page of a PDF, as its operators. */
export function pageContents(pdf: Buffer): string[] {
  const source = pdf.toString('latin1')
  return pageIds(source).map(id => contentOf(source, objectText(source, id)))
}

/** Every glyph that the pages of a PDF draw, by its number in its font in four hexadecimal figures. */
export function drawnGlyphs(pdf: Buffer): string[] {
  return pageContents(pdf).flatMap(content => [...content.matchAll(/\[([^\]]*)\] TJ/g)].flatMap(([, shown]) => glyphsOf(shown!)))
}

function contentOf(source: string, page: string): string {
  return streamText(source, /\/Contents (\d+) 0 R/.exec(page)![1]!)
}

function glyphsOf(shown: string): string[] {
  return [...shown.matchAll(/<([0-9a-f]*)>/gi)].flatMap(([, hex]) => hex!.match(/.{4}/g) ?? [])
}

function linesOf(content: string, fonts: Map<string, Map<number, string>>): string[] {
  const lines: string[] = []
  let letters = new Map<number, string>()
  for (const [, font, shown] of content.matchAll(/\/(F\d+) [\d.]+ Tf|\[([^\]]*)\] TJ/g)) {
    if (font) letters = fonts.get(font) ?? new Map()
    else lines.push(glyphsOf(shown!).map(glyph => letters.get(Number.parseInt(glyph, 16)) ?? '\uFFFD').join(''))
  }
  return lines
}

/** What the glyphs of a font stand for, by its own table. */
function lettersOf(source: string, font: string): Map<number, string> {
  const table = streamText(source, /\/ToUnicode (\d+) 0 R/.exec(objectText(source, font))![1]!)
  const letters = new Map<number, string>()
  for (const [, first, texts] of table.matchAll(/<([0-9a-f]{4})> <[0-9a-f]{4}> \[([^\]]*)\]/gi)) {
    [...texts!.matchAll(/<([0-9a-f ]*)>/gi)].forEach(([, hex], index) => {
      const units = hex!.replaceAll(' ', '').match(/.{4}/g) ?? []
      letters.set(Number.parseInt(first!, 16) + index, String.fromCharCode(...units.map(unit => Number.parseInt(unit, 16))))
    })
  }
  return letters
}
