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

/** Millimetres to the inch, by definition. */
export const MM_PER_INCH = 25.4

/** Eight dots to the millimetre, sold as "203 dpi", and the finer of the usual label printers: from memory. */
export const ROLL_PRINTER_DPI = [203.2, 300] as const

/** Office printers have 300, 600 or 1,200 (from memory): what lies on whole dots of the coarsest does on the others. */
const SHEET_PRINTER_DPI = 300

const LETTER = { width: 215.9, height: 279.4 }
const A4 = { width: 210, height: 297 }

const SUMS_TO_SHEET = 'from memory; the figures sum to the sheet'

function roll<Id extends string>(id: Id, name: string, label: SizeMm) {
  return {
    id, name, label, page: label,
    grid: { columns: 1, rows: 1 }, margin: { top: 0, left: 0 }, pitch: { x: label.width, y: label.height },
    dotsPerInch: ROLL_PRINTER_DPI[0], source: 'one label a page, whole inches',
  }
}

/** The stocks that labels are printed on. */
export const LABEL_STOCKS = {
  'roll-4x2': roll('roll-4x2', 'Roll, 4 × 2 in', { width: 101.6, height: 50.8 }),
  'roll-4x6': roll('roll-4x6', 'Roll, 4 × 6 in', { width: 101.6, height: 152.4 }),
  'roll-3x2': roll('roll-3x2', 'Roll, 3 × 2 in', { width: 76.2, height: 50.8 }),
  'roll-2x1': roll('roll-2x1', 'Roll, 2 × 1 in', { width: 50.8, height: 25.4 }),
  'letter-30': {
    id: 'letter-30',
    name: 'Letter sheet, 30 labels of 2 5/8 × 1 in',
    page: LETTER,
    label: { width: 66.675, height: 25.4 },
    grid: { columns: 3, rows: 10 },
    margin: { top: 12.7, left: 4.763 },
    pitch: { x: 69.85, y: 25.4 },
    dotsPerInch: SHEET_PRINTER_DPI,
    source: 'as published in label templates; the figures sum to the sheet',
  },
  'letter-10': {
    id: 'letter-10',
    name: 'Letter sheet, 10 labels of 4 × 2 in',
    page: LETTER,
    label: { width: 101.6, height: 50.8 },
    grid: { columns: 2, rows: 5 },
    margin: { top: 12.7, left: 3.969 },
    pitch: { x: 106.363, y: 50.8 },
    dotsPerInch: SHEET_PRINTER_DPI,
    source: SUMS_TO_SHEET,
  },
  'letter-6': {
    id: 'letter-6',
    name: 'Letter sheet, 6 labels of 4 × 3 1/3 in',
    page: LETTER,
    label: { width: 101.6, height: 84.667 },
    grid: { columns: 2, rows: 3 },
    margin: { top: 12.7, left: 3.969 },
    pitch: { x: 106.363, y: 84.667 },
    dotsPerInch: SHEET_PRINTER_DPI,
    source: SUMS_TO_SHEET,
  },
  'a4-21': {
    id: 'a4-21',
    name: 'A4 sheet, 21 labels of 63.5 × 38.1 mm',
    page: A4,
    label: { width: 63.5, height: 38.1 },
    grid: { columns: 3, rows: 7 },
    margin: { top: 15.15, left: 7.2 },
    pitch: { x: 66, y: 38.1 },
    dotsPerInch: SHEET_PRINTER_DPI,
    source: 'as published in label templates; the figures sum to the sheet within 0.1 mm',
  },
  'a4-14': {
    id: 'a4-14',
    name: 'A4 sheet, 14 labels of 99.1 × 38.1 mm',
    page: A4,
    label: { width: 99.1, height: 38.1 },
    grid: { columns: 2, rows: 7 },
    margin: { top: 15.15, left: 4.65 },
    pitch: { x: 101.6, y: 38.1 },
    dotsPerInch: SHEET_PRINTER_DPI,
    source: SUMS_TO_SHEET,
  },
  'a4-8': {
    id: 'a4-8',
    name: 'A4 sheet, 8 labels of 99.1 × 67.7 mm',
    page: A4,
    label: { width: 99.1, height: 67.7 },
    grid: { columns: 2, rows: 4 },
    margin: { top: 13.1, left: 4.65 },
    pitch: { x: 101.6, y: 67.7 },
    dotsPerInch: SHEET_PRINTER_DPI,
    source: SUMS_TO_SHEET,
  },
} as const satisfies Record<string, LabelStock>

/** The name of a stock, as it stands in addresses and settings. */
export type LabelStockId = keyof typeof LABEL_STOCKS

/** Whether a stock of this name is known. */
export function isLabelStockId(text: string): text is LabelStockId {
  return Object.hasOwn(LABEL_STOCKS, text)
}

/** Whether the labels come from a roll, one a page. */
export function isRoll(stock: LabelStock): boolean {
  return labelsPerPage(stock) === 1
}

/** Whether a contents tag fits the labels of a stock: 4 x 2 in, or what A4 has in its place. */
export function takesTag({ label }: LabelStock): boolean {
  return label.width >= 99 && label.height >= 50
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
