import { writeFileSync } from 'node:fs'
import { labelSymbol, QUIET_MODULES } from '../../utils/label/symbol'
import { boundsOf, drawnPages, isInside, symbolsOf, type DrawnPage } from './pdfShapes'

const WIDTH = 640
const HEIGHT = 480
const [INK, PAPER, WALL] = [16, 235, 150]

/** How much of a page the camera sees: four inches across, so that a label fills the picture. */
const POINTS_ACROSS = 288

/** Writes a film of the symbol that a label with this payload carries, for a browser's fake camera. */
export function filmOfCode(payload: string, file: string): void {
  const symbol = labelSymbol(payload)
  const modules = symbol.size + 2 * QUIET_MODULES
  const scale = Math.floor(HEIGHT * 0.8 / modules)
  const left = Math.floor((WIDTH - modules * scale) / 2)
  const top = Math.floor((HEIGHT - modules * scale) / 2)
  writeFilm(file, (x, y) => {
    const column = Math.floor((x - left) / scale)
    const row = Math.floor((y - top) / scale)
    if (column < 0 || row < 0 || column >= modules || row >= modules) return WALL
    return symbol.isDark(column - QUIET_MODULES, row - QUIET_MODULES) ? INK : PAPER
  })
}

/**
 * Writes a film of a printed label: the first page of a PDF as it is drawn in the file (letters excepted), with
 * the camera held over the page's first symbol.
 */
export function filmOfLabelPdf(pdf: Buffer, file: string): void {
  const page = drawnPages(pdf)[0]
  const symbol = page && symbolsOf(page)[0]
  if (!page || !symbol) throw new Error('This PDF shows no symbol on its first page')
  const bounds = boundsOf(symbol)
  const pointsPerPixel = POINTS_ACROSS / WIDTH
  const left = (bounds.left + bounds.right - POINTS_ACROSS) / 2
  const top = (bounds.top + bounds.bottom) / 2 - HEIGHT * pointsPerPixel / 2
  const seen = nearby(page, left, top, POINTS_ACROSS, HEIGHT * pointsPerPixel)
  writeFilm(file, (x, y) => {
    const [pageX, pageY] = [left + (x + 0.5) * pointsPerPixel, top + (y + 0.5) * pointsPerPixel]
    if (pageX < 0 || pageY < 0 || pageX > page.width || pageY > page.height) return WALL
    return isInside(seen, pageX, pageY) ? INK : PAPER
  })
}

function nearby(page: DrawnPage, left: number, top: number, width: number, height: number) {
  return page.fills.flat().filter((outline) => {
    const box = boundsOf([outline])
    return box.right > left && box.left < left + width && box.bottom > top && box.top < top + height
  })
}

/** A film of two equal frames in YUV4MPEG2 (4:2:0, full range): a text header, then each frame's brightness and two flat colour planes. */
function writeFilm(file: string, brightness: (x: number, y: number) => number): void {
  const luma = Buffer.from(Array.from({ length: WIDTH * HEIGHT }, (_, at) => brightness(at % WIDTH, Math.floor(at / WIDTH))))
  const colourless = Buffer.alloc(WIDTH * HEIGHT / 2, 128)
  const frame = Buffer.concat([Buffer.from('FRAME\n'), luma, colourless])
  const header = Buffer.from(`YUV4MPEG2 W${WIDTH} H${HEIGHT} F10:1 Ip A1:1 C420jpeg\n`)
  writeFileSync(file, Buffer.concat([header, frame, frame]))
}
