import type { CorrectionLevel } from './qrMatrix'

/** The four faces of a label: figures and codes in Roboto Mono, words in Barlow. */
export type LabelFace = 'figures' | 'figures-bold' | 'words' | 'words-bold'

/** One run of text; `y` is its baseline. It is set smaller where it would be wider than `maxWidth`, never cut. */
export interface LabelText {
  text: string
  face: LabelFace
  size: number
  x: number
  y: number
  align: 'left' | 'right'
  maxWidth: number
}

/** A filled bar: a dividing line, or the line to write on. */
export interface LabelRule {
  x: number
  y: number
  width: number
  thickness: number
}

/** A drawn line, as an SVG path of absolute M, L, Q and Z. */
export interface LabelStroke {
  path: string
  thickness: number
}

/** The symbol: `x`, `y` is the corner of its dark part, `path` its outline in modules. */
export interface LabelQr {
  payload: string
  version: number
  level: CorrectionLevel
  modules: number
  moduleMm: number
  x: number
  y: number
  path: string
}

/** Whatever is printed on one label, as plain data; all lengths in millimetres from its top left corner. */
export interface LabelDrawing {
  width: number
  height: number
  qr: LabelQr | null
  strokes: LabelStroke[]
  texts: LabelText[]
  rules: LabelRule[]
}

/** A part of a label, in millimetres from the label's top left corner. */
export interface LabelBox {
  x: number
  y: number
  width: number
  height: number
}

/** A frame whose upper corners are rounder than its lower ones, as the path of a stroke. */
export function collarFrame({ x, y, width, height }: LabelBox, upper: number, lower: number): string {
  const [right, bottom] = [x + width, y + height]
  return [
    `M${x} ${y + upper}Q${x} ${y} ${x + upper} ${y}L${right - upper} ${y}Q${right} ${y} ${right} ${y + upper}`,
    `L${right} ${bottom - lower}Q${right} ${bottom} ${right - lower} ${bottom}L${x + lower} ${bottom}Q${x} ${bottom} ${x} ${bottom - lower}Z`,
  ].join('')
}
