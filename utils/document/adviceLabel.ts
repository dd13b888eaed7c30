import type { LabelDrawing } from '../label/drawing'
import { FREE_EDGE_MM } from '../label/printer'
import type { LabelStock } from '../label/stock'
import { LABEL_ADVICE } from './labelAdvice'
import { fittedLines, LINE_SPACING } from './wrappedText'

const SIZES = [6, 5, 4.4, 4, 3.6, 3.2, 2.8, 2.4] as const

/** On a small label everything runs on as one paragraph. */
const SMALL_SIZES = [2.4, 2.1, 1.9] as const

/**
 * What to mind before a label is stuck on, as the first label of a roll.
 *
 * Units: millimetres. The type is as large as fits the label.
 */
export function adviceLabel({ label: { width, height } }: LabelStock): LabelDrawing {
  const room = { width: width - 2 * FREE_EDGE_MM, height: height - 2 * FREE_EDGE_MM }
  const eachOnItsOwn = SIZES
    .map(size => ({ size, lines: LABEL_ADVICE.flatMap(advice => fittedLines(advice, room, [size]).lines) }))
    .find(({ size, lines }) => lines.length * size * LINE_SPACING <= room.height)
  const { size, lines } = eachOnItsOwn ?? fittedLines(LABEL_ADVICE.join(' '), room, SMALL_SIZES)
  return {
    width, height, qr: null, strokes: [], rules: [],
    texts: lines.map((text, index) => ({
      text, face: 'words-bold', size, x: FREE_EDGE_MM, y: FREE_EDGE_MM + size * (0.85 + LINE_SPACING * index), align: 'left', maxWidth: room.width,
    })),
  }
}
