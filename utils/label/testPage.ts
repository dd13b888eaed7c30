import type { LabelBox, LabelDrawing, LabelRule, LabelText } from './drawing'
import { FREE_EDGE_MM, type LabelPrinter } from './printer'
import type { LabelSheet } from './sheet'
import { labelOrigin, labelsPerPage, type LabelStock } from './stock'

/** Rulers are as long as the label allows: what is measured over more is measured better. Millimetres. */
const RULER_LENGTHS = [50, 40, 20] as const
/** Beside the ruler: its line, and the paper that its ends need. */
const RULER_MARGIN = 1
const LINE = 0.25

/**
 * The test page of a stock and a printer: a ruler across and one down, and the frame that has to come out 2 mm inside
 * every label.
 *
 * Units: millimetres. Shape: one page, moved by the printer's offset; the rulers are on the first label.
 */
export function testPage(stock: LabelStock, { offset }: LabelPrinter): LabelSheet {
  const frames = Array.from({ length: labelsPerPage(stock) }, (_, index) => inside({ ...labelOrigin(stock, index + 1), ...stock.label }))
  const [first] = frames as [LabelBox]
  const across = rulerLength(first.width)
  const down = rulerLength(first.height)
  const rulers = [ruler(first, across, 'across'), ruler(first, down, 'down')]
  const label: LabelDrawing = {
    ...stock.page,
    qr: null,
    strokes: frames.map(({ x, y, width, height }) => ({ path: `M${x} ${y}L${x + width} ${y}L${x + width} ${y + height}L${x} ${y + height}Z`, thickness: LINE })),
    texts: wordsUnder(first, [`${across} mm across, ${down} mm down.`, 'If it measures otherwise, the', 'printer is scaling: set it to 100 %.']),
    rules: rulers.flat(),
  }
  return { page: stock.page, pages: [[{ position: 1, ...offset, symbol: null, label }]] }
}

function inside({ x, y, width, height }: LabelBox): LabelBox {
  return { x: x + FREE_EDGE_MM, y: y + FREE_EDGE_MM, width: width - 2 * FREE_EDGE_MM, height: height - 2 * FREE_EDGE_MM }
}

function rulerLength(room: number): number {
  return RULER_LENGTHS.find(length => length + RULER_MARGIN <= room) ?? RULER_LENGTHS[2]
}

/** Its line with a mark every 5 mm, the tens longer; across it hangs from the frame's top, down from its right side. */
function ruler(frame: LabelBox, length: number, way: 'across' | 'down'): LabelRule[] {
  const [left, top] = way === 'across' ? [frame.x + RULER_MARGIN / 2, frame.y + 1] : [frame.x + frame.width - 1, frame.y + RULER_MARGIN / 2]
  const line = way === 'across'
    ? { x: left, y: top, width: length, thickness: LINE }
    : { x: left - LINE, y: top, width: LINE, thickness: length }
  const marks = Array.from({ length: length / 5 + 1 }, (_, index) => {
    const long = index % 2 === 0 ? 3 : 1.8
    // The last mark ends where the line does: the ruler is as long as from outer edge to outer edge.
    const at = Math.min(index * 5, length - LINE)
    return way === 'across'
      ? { x: left + at, y: top, width: LINE, thickness: long }
      : { x: left - long, y: top + at, width: long, thickness: LINE }
  })
  return [line, ...marks]
}

function wordsUnder(frame: LabelBox, lines: string[]): LabelText[] {
  const size = Math.min(3.6, frame.height / 8)
  return lines.map((text, index) => ({
    text, face: 'words-bold', size, x: frame.x + 1, y: frame.y + 5.5 + size * 1.3 * (index + 1), align: 'left', maxWidth: frame.width - 6,
  }))
}
