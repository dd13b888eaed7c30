import { isRoll, MM_PER_INCH, ROLL_PRINTER_DPI, type LabelStock } from './stock'

/** A printer as it was found at the test page: how fine it is, and how far its print has to be moved. */
export interface LabelPrinter {
  dotsPerInch: number
  /** To the right and down, in millimetres. */
  offset: { x: number, y: number }
}

/** Everything printed stays this far inside the edge of its label. */
export const FREE_EDGE_MM = 2

/** Offsets are set in these steps. */
const OFFSET_STEP_MM = 0.5

/** The printer that a stock is usually printed on, its print not moved. */
export function usualPrinter(stock: LabelStock): LabelPrinter {
  return { dotsPerInch: stock.dotsPerInch, offset: { x: 0, y: 0 } }
}

/** How fine the printers for this stock may be, in dots per inch; the first is the usual one. */
export function printerChoices(stock: LabelStock): readonly number[] {
  return isRoll(stock) ? ROLL_PRINTER_DPI : [stock.dotsPerInch]
}

/**
 * The offsets that a print on this stock may have, either way: with more, what is printed would leave the page.
 *
 * Units: millimetres, in steps of 0.5. Rounding: down.
 *
 * @example offsetsFor(LABEL_STOCKS['roll-4x2']) // -2, -1.5 … 2
 */
export function offsetsFor(stock: LabelStock): number[] {
  const margins = [
    stock.margin.left, stock.margin.top,
    stock.page.width - stock.margin.left - (stock.grid.columns - 1) * stock.pitch.x - stock.label.width,
    stock.page.height - stock.margin.top - (stock.grid.rows - 1) * stock.pitch.y - stock.label.height,
  ]
  // The sums of a stock's figures end in the noise of binary fractions.
  const steps = Math.floor((FREE_EDGE_MM + Math.min(...margins) + 1e-6) / OFFSET_STEP_MM)
  return Array.from({ length: 2 * steps + 1 }, (_, index) => (index - steps) * OFFSET_STEP_MM)
}

/** The width of one of the printer's dots, in millimetres. */
export function dotMm({ dotsPerInch }: Pick<LabelPrinter, 'dotsPerInch'>): number {
  return MM_PER_INCH / dotsPerInch
}

/**
 * The nearest place that begins a dot of the printer.
 *
 * Units: millimetres from the page's edge. Rounding: to the nearest dot.
 */
export function snapToDot(printer: Pick<LabelPrinter, 'dotsPerInch'>, mm: number): number {
  return Math.round(mm / dotMm(printer)) * dotMm(printer)
}
