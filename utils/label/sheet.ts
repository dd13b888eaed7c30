import type { LabelDrawing } from './drawing'
import { snapToDot, usualPrinter, type LabelPrinter } from './printer'
import { labelOrigin, labelsPerPage, type LabelStock, type SizeMm } from './stock'

/** A label in its place: millimetres from the top left corner of the page to that of the label and to that of its symbol. */
export interface PlacedLabel<Label extends LabelDrawing = LabelDrawing> {
  position: number
  x: number
  y: number
  /** null where the label has no symbol. */
  symbol: { x: number, y: number } | null
  label: Label
}

/** Labels laid out on the pages of one stock. */
export interface LabelSheet<Label extends LabelDrawing = LabelDrawing> {
  page: SizeMm
  pages: PlacedLabel<Label>[][]
}

/**
 * Labels laid out on a stock, page by page, from the first free label of a part-used sheet, moved by the printer's offset.
 *
 * Shape: labels in the order of printing; `startPosition` counts from 1 and concerns the first page only.
 * Rounding: the symbols, and nothing else, are moved to the printer's nearest dot.
 * Errors: RangeError for a start that the page does not have.
 */
export function sheet<Label extends LabelDrawing>(
  labels: Label[], stock: LabelStock, startPosition = 1, printer: LabelPrinter = usualPrinter(stock),
): LabelSheet<Label> {
  labelOrigin(stock, startPosition)
  const perPage = labelsPerPage(stock)
  const pages: PlacedLabel<Label>[][] = []
  labels.forEach((label, index) => {
    const place = startPosition - 1 + index
    const position = place % perPage + 1
    const origin = labelOrigin(stock, position)
    const [x, y] = [origin.x + printer.offset.x, origin.y + printer.offset.y]
    const symbol = label.qr && { x: snapToDot(printer, x + label.qr.x), y: snapToDot(printer, y + label.qr.y) }
    const page = pages[Math.floor(place / perPage)] ??= []
    page.push({ position, x, y, symbol, label })
  })
  return { page: stock.page, pages }
}
