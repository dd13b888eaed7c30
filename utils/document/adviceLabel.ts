import type { LabelDrawing } from '../label/drawing'
import { FREE_EDGE_MM } from '../label/printer'
import type { LabelStock } from '../label/stock'
import { LABEL_ADVICE } from './labelAdvice'
import { fittedLines } from './wrappedText'

const SIZES = [6, 5, 4.4, 4, 3.6, 3.2, 2.8, 2.4, 1.9] as const

/**
 * What to mind before a label is stuck on, as the first label of a roll.
 *
 * Units: millimetres. The type is as large as fits the label.
 */
export function adviceLabel({ label: { width, height } }: LabelStock): LabelDrawing {
  const room = { width: width - 2 * FREE_EDGE_MM, height: height - 2 * FREE_EDGE_MM }
  const fits = (size: number) => {
    const lines = LABEL_ADVICE.flatMap(advice => fittedLines(advice, { ...room, height: Infinity }, [size]).lines)
    return { size, lines, isFitting: lines.length * size * 1.15 <= room.height }
  }
  const { size, lines } = SIZES.map(fits).find(({ isFitting }) => isFitting) ?? fits(1.9)
  return {
    width, height, qr: null, strokes: [], rules: [],
    texts: lines.map((text, index) => ({
      text, face: 'words-bold', size, x: FREE_EDGE_MM, y: FREE_EDGE_MM + size * (0.85 + 1.15 * index), align: 'left', maxWidth: room.width,
    })),
  }
}
