import type { LabelFace } from '~~/utils/label/drawing'
import { spelled } from '~~/utils/label/printable'
import type { LabelFonts } from './fonts'

/** A piece of a text that one font file has all letters of; `font` is its name in the document. */
export interface FaceRun { text: string, font: string }

/** The document as far as it says which letters the font it is set to has, which its types leave out. */
interface WithFont { _font: { font: { hasGlyphForCodePoint: (codePoint: number) => boolean } } }

/**
 * Makes the faces known to a document and gives what parts a text among their files: each letter by the first that has
 * it, and one that none has by its number, never as an empty box.
 */
export function faceRuns(document: PDFKit.PDFDocument, fonts: LabelFonts): (face: LabelFace, text: string) => FaceRun[] {
  const faces = Object.entries(fonts) as [LabelFace, LabelFonts[LabelFace]][]
  const namesOf = new Map(faces.map(([face, files]) => [face, files.map((_, index) => `${face} ${index}`)]))
  for (const [face, files] of faces) files.forEach((file, index) => document.registerFont(`${face} ${index}`, file))
  const known = new Map<string, string | undefined>()

  function fontOf(face: LabelFace, letter: string): string | undefined {
    const key = `${face} ${letter}`
    if (!known.has(key)) known.set(key, namesOf.get(face)!.find(name => has(document.font(name), letter)))
    return known.get(key)
  }

  return (face, text) => {
    const pieces = [...text].map((letter): FaceRun => {
      const font = fontOf(face, letter)
      return font === undefined ? { text: spelled(letter), font: `${face} 0` } : { text: letter, font }
    })
    return pieces.reduce<FaceRun[]>((runs, piece) => {
      const last = runs.at(-1)
      return last?.font === piece.font ? [...runs.slice(0, -1), { ...last, text: last.text + piece.text }] : [...runs, piece]
    }, [])
  }
}

function has(document: PDFKit.PDFDocument, letter: string): boolean {
  return (document as unknown as WithFont)._font.font.hasGlyphForCodePoint(letter.codePointAt(0)!)
}
