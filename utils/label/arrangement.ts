import type { LabelBox } from './drawing'
import { FREE_EDGE_MM } from './printer'
import type { SizeMm } from './stock'

/** Where a label's symbol and its text stand, and how much the text says. */
export interface Arrangement {
  /** Everything, the least that is worth reading, or what lies between. */
  form: 'full' | 'medium' | 'small'
  /** The place of the symbol with its quiet zone: its middle and the side it may have. */
  symbol: { x: number, y: number, sideMm: number }
  text: LabelBox
}

/** The full text is drawn 57.2 mm wide on a label 50.8 mm high, and scaled from there. */
export const FULL_TEXT: SizeMm = { width: 57.2, height: 50.8 }

/** 37 modules of 1.016 mm: the usual symbol, with the nearest to 1 mm that 300 and 600 dpi printers can draw. */
const SYMBOL_SIDE = 37.6
/** A part of a dot either way is lost in moving a symbol to the printer's dots. */
const ROOM_TO_SNAP = 0.2
const TALL_FROM = 100
const FULL_FROM: SizeMm = { width: 95, height: 45 }
const MEDIUM_FROM_WIDTH = 60
/** Facts in two columns, or a code in one line, want as much to be legible. */
const LEAST_TEXT = 38

/**
 * How a label of this size is divided.
 *
 * Shape: the symbol to the left, the text to its right; on a tall label the symbol on its centre line, the text below it.
 * Units: millimetres. The quiet zone may reach the edge, what is black never nearer than 2 mm.
 */
export function arrangement({ width, height }: SizeMm): Arrangement {
  if (height >= TALL_FROM) {
    const textWidth = width - 2 * FREE_EDGE_MM - 2
    const scale = textWidth / FULL_TEXT.width
    const textHeight = FULL_TEXT.height * scale
    const side = Math.min(width, height - textHeight)
    return {
      form: 'full',
      symbol: { x: width / 2, y: side / 2, sideMm: side - ROOM_TO_SNAP },
      text: { x: (width - textWidth) / 2, y: side, width: textWidth, height: textHeight },
    }
  }
  if (width >= FULL_FROM.width && height >= FULL_FROM.height) {
    const left = 42
    const textWidth = width - left - 2.4
    const textHeight = FULL_TEXT.height * textWidth / FULL_TEXT.width
    return {
      form: 'full',
      symbol: { x: 2.4 + SYMBOL_SIDE / 2, y: height / 2, sideMm: SYMBOL_SIDE },
      text: { x: left, y: (height - textHeight) / 2, width: textWidth, height: textHeight },
    }
  }
  const form = width >= MEDIUM_FROM_WIDTH ? 'medium' : 'small'
  const side = Math.min(SYMBOL_SIDE, height - ROOM_TO_SNAP, form === 'medium' ? width - LEAST_TEXT : width)
  const left = side + ROOM_TO_SNAP + 0.8
  return {
    form,
    symbol: { x: (side + ROOM_TO_SNAP) / 2, y: height / 2, sideMm: side },
    text: { x: left, y: FREE_EDGE_MM, width: width - left - FREE_EDGE_MM, height: height - 2 * FREE_EDGE_MM },
  }
}
