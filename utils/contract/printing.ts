import type { LabelPrinter } from '../label/printer'
import { LABEL_STOCKS, type LabelStockId } from '../label/stock'

/** Most codes on one printing. */
export const MOST_LABELS = 100

/** Everything that a person chooses before printing. */
export interface PrintSetting {
  stock: LabelStockId
  start: number
  printer: LabelPrinter
  diameterMm: number | null
  /** Whether a label before the first says what to mind before one is stuck on. */
  withAdvice: boolean
}

/** Where the labels of these codes are to be had as a PDF. */
export function labelsPdfPath(codes: readonly string[], { stock, start, printer, diameterMm, withAdvice }: PrintSetting): string {
  return pathWith('/api/labels.pdf', {
    codes: codes.join(','), ...asked(stock, printer), start: start === 1 ? null : start, diameter: diameterMm, advice: withAdvice ? '1' : null,
  })
}

/** Where the contents tag of a cylinder is to be had as a PDF. */
export function contentsTagPath(cylinderId: string, stock: LabelStockId, start: number, printer: LabelPrinter): string {
  return pathWith(`/api/cylinders/${cylinderId}/contents-tag.pdf`, { ...asked(stock, printer), start: start === 1 ? null : start })
}

/** Where the test page for a stock and a printer is. */
export function testPagePath(stock: LabelStockId, printer: LabelPrinter): string {
  return pathWith('/api/labels/test-page.pdf', asked(stock, printer))
}

function asked(stock: LabelStockId, { dotsPerInch, offset }: LabelPrinter) {
  return { stock, dpi: dotsPerInch === LABEL_STOCKS[stock].dotsPerInch ? null : dotsPerInch, x: offset.x || null, y: offset.y || null }
}

function pathWith(path: string, query: Record<string, string | number | null>): string {
  const parts = Object.entries(query).flatMap(([name, value]) => value === null ? [] : [`${name}=${encodeURIComponent(value)}`])
  return `${path}?${parts.join('&')}`
}
