/** A size in millimetres. */
export interface SizeMm {
  width: number
  height: number
}

/** One kind of label stock: where on its page the labels are, and how fine the printer is that takes it. All lengths in millimetres. */
export interface LabelStock {
  id: string
  /** What the print dialog calls it. */
  name: string
  page: SizeMm
  label: SizeMm
  grid: { columns: number, rows: number }
  margin: { top: number, left: number }
  /** From the left edge of one label to that of its neighbour, and from top edge to top edge. */
  pitch: { x: number, y: number }
  /** Dots per inch of the usual printer for this stock; modules are drawn a whole number of its dots wide. */
  dotsPerInch: number
  /** Where the sizes come from. */
  source: string
}

const MM_PER_INCH = 25.4

/** The stocks that labels are printed on. */
export const LABEL_STOCKS = {
  'roll-4x2': {
    id: 'roll-4x2',
    name: 'Roll, 4 × 2 in',
    page: { width: 101.6, height: 50.8 },
    label: { width: 101.6, height: 50.8 },
    grid: { columns: 1, rows: 1 },
    margin: { top: 0, left: 0 },
    pitch: { x: 101.6, y: 50.8 },
    // Eight dots to the millimetre, sold as "203 dpi": from memory.
    dotsPerInch: 203.2,
    source: 'one label a page: 4 in and 2 in exactly',
  },
  'letter-10': {
    id: 'letter-10',
    name: 'Letter sheet, 10 labels of 4 × 2 in',
    page: { width: 215.9, height: 279.4 },
    label: { width: 101.6, height: 50.8 },
    grid: { columns: 2, rows: 5 },
    margin: { top: 12.7, left: 3.969 },
    pitch: { x: 106.363, y: 50.8 },
    // Office printers: from memory.
    dotsPerInch: 600,
    source: 'from memory; the figures sum to the width of the sheet',
  },
} as const satisfies Record<string, LabelStock>

/** The name of a stock, as it stands in addresses and settings. */
export type LabelStockId = keyof typeof LABEL_STOCKS

/** Whether a stock of this name is known. */
export function isLabelStockId(text: string): text is LabelStockId {
  return Object.hasOwn(LABEL_STOCKS, text)
}

/** How many labels one page of the stock holds. */
export function labelsPerPage(stock: LabelStock): number {
  return stock.grid.columns * stock.grid.rows
}

/**
 * Where a label lies on its page: its top left corner, in millimetres from that of the page.
 *
 * Shape: positions count from 1 along the rows, as one reads.
 * Errors: RangeError for a position that the page does not have.
 */
export function labelOrigin(stock: LabelStock, position: number): { x: number, y: number } {
  if (!Number.isInteger(position) || position < 1 || position > labelsPerPage(stock)) {
    throw new RangeError(`No label ${position} on a page of ${labelsPerPage(stock)}`)
  }
  const column = (position - 1) % stock.grid.columns
  const row = Math.floor((position - 1) / stock.grid.columns)
  return {
    x: stock.margin.left + column * stock.pitch.x,
    y: stock.margin.top + row * stock.pitch.y,
  }
}

/** The width of one of the printer's dots, in millimetres. */
export function dotMm(stock: LabelStock): number {
  return MM_PER_INCH / stock.dotsPerInch
}

/**
 * The nearest place that begins a dot of the printer.
 *
 * Units: millimetres from the page's edge. Rounding: to the nearest dot.
 */
export function snapToDot(stock: LabelStock, mm: number): number {
  return Math.round(mm / dotMm(stock)) * dotMm(stock)
}
