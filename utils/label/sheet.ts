import type { IdentityLabel } from './identityLabel'
import { labelOrigin, labelsPerPage, snapToDot, type LabelStock, type SizeMm } from './stock'

/** A label in its place: millimetres from the top left corner of the page to that of the label and to that of its symbol. */
export interface PlacedLabel {
  position: number
  x: number
  y: number
  qrX: number
  qrY: number
  label: IdentityLabel
}

/** Labels laid out on the pages of one stock. */
export interface LabelSheet {
  page: SizeMm
  pages: PlacedLabel[][]
}

/**
 * Labels laid out on a stock, page by page, from the first free label of a part-used sheet.
 *
 * Shape: labels in the order of printing; `startPosition` counts from 1 and concerns the first page only.
 * Rounding: the symbols, and nothing else, are moved to the printer's nearest dot.
 * Errors: RangeError for a start that the page does not have.
 */
export function sheet(labels: IdentityLabel[], stock: LabelStock, startPosition = 1): LabelSheet {
  labelOrigin(stock, startPosition)
  const perPage = labelsPerPage(stock)
  const pages: PlacedLabel[][] = []
  labels.forEach((label, index) => {
    const place = startPosition - 1 + index
    const position = place % perPage + 1
    const { x, y } = labelOrigin(stock, position)
    const page = pages[Math.floor(place / perPage)] ??= []
    page.push({ position, x, y, qrX: snapToDot(stock, x + label.qr.x), qrY: snapToDot(stock, y + label.qr.y), label })
  })
  return { page: stock.page, pages }
}
