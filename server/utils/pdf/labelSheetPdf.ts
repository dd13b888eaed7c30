import PDFDocument from 'pdfkit'
import type { LabelQr, LabelText } from '~~/utils/label/drawing'
import { forPrint } from '~~/utils/label/printable'
import type { LabelSheet, PlacedLabel } from '~~/utils/label/sheet'
import { faceRuns, type FaceRun } from './faceText'
import type { LabelFonts } from './fonts'

const POINTS_PER_MM = 72 / 25.4

type RunsOf = ReturnType<typeof faceRuns>

/**
 * The pages of a label sheet as a PDF, every length exactly as laid out, the symbols as vectors.
 *
 * Shape: `compress: false` leaves the drawing readable in the file.
 * Errors: RangeError for a sheet without a label, of which there is no page to print.
 */
export function labelSheetPdf(sheet: LabelSheet, fonts: LabelFonts, options: { compress?: boolean, title?: string } = {}): Promise<Buffer> {
  if (sheet.pages.length === 0) throw new RangeError('A sheet without a label')
  const document = new PDFDocument({
    autoFirstPage: false,
    compress: options.compress ?? true,
    // Without a face here the document begins with a built-in one, whose measures it looks for on the disk.
    font: fonts.words[0] as unknown as string,
    info: { Title: options.title ?? 'Cylinder labels', Creator: 'Collarbook', Producer: 'Collarbook' },
  })
  const runsOf = faceRuns(document, fonts)

  const finished = collected(document)
  for (const page of sheet.pages) {
    document.addPage({ size: [sheet.page.width * POINTS_PER_MM, sheet.page.height * POINTS_PER_MM], margin: 0 })
    document.scale(POINTS_PER_MM)
    for (const placed of page) drawLabel(document, placed, runsOf)
  }
  document.end()
  return finished
}

function collected(document: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = []
    document.on('data', (chunk: Buffer) => chunks.push(chunk))
    document.on('end', () => resolve(Buffer.concat(chunks)))
    document.on('error', reject)
  })
}

function drawLabel(document: PDFKit.PDFDocument, { label, x, y, symbol }: PlacedLabel, runsOf: RunsOf): void {
  if (label.qr && symbol) drawSymbol(document, label.qr, symbol.x, symbol.y)
  document.save().translate(x, y)
  for (const { path, thickness } of label.strokes) document.path(path).lineWidth(thickness).stroke('black')
  for (const rule of label.rules) document.rect(rule.x, rule.y, rule.width, rule.thickness).fill('black')
  for (const text of label.texts) drawText(document, text, runsOf(text.face, forPrint(text.text)))
  document.restore()
}

/** The path is in whole modules, so that its edges fall on dots whatever the place on the page. */
function drawSymbol(document: PDFKit.PDFDocument, qr: LabelQr, x: number, y: number): void {
  document.save().translate(x, y).scale(qr.moduleMm).path(qr.path).fill('black').restore()
}

function drawText(document: PDFKit.PDFDocument, { size, x, y, align, maxWidth }: LabelText, runs: FaceRun[]): void {
  const widths = runs.map(({ text, font }) => document.font(font, size).widthOfString(text))
  const natural = widths.reduce((sum, width) => sum + width, 0)
  const fitting = Math.min(1, maxWidth / natural)
  let at = align === 'right' ? x - natural * fitting : x
  runs.forEach(({ text, font }, index) => {
    document.font(font, size * fitting).fillColor('black').text(text, at, y, { baseline: 'alphabetic', lineBreak: false })
    at += widths[index]! * fitting
  })
}
