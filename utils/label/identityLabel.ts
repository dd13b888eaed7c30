import { arrangement } from './arrangement'
import type { LabelDrawing, LabelQr } from './drawing'
import { fullText } from './fullText'
import type { IdentityLabelContent } from './identityContent'
import { moduleSize, type ModuleSize } from './moduleSize'
import { mediumText, smallText } from './rowText'
import { placedSymbol } from './placedSymbol'
import type { LabelStock } from './stock'
import { labelSymbol } from './symbol'

/** A label that names a cylinder. */
export interface IdentityLabel extends LabelDrawing {
  code: string
  qr: LabelQr
}

/** What the symbol of a label is fitted to. */
export interface Fitting {
  stock: LabelStock
  dotsPerInch: number
  /** Of the cylinder, in millimetres; null for a flat place, or where it is not known. */
  diameterMm: number | null
}

/** How the symbol of this address comes out on a stock: the modules that it gets, or why it does not fit. */
export function symbolFit(payload: string, { stock, dotsPerInch, diameterMm }: Fitting): ModuleSize {
  return moduleSize({ modules: labelSymbol(payload).size, sideMm: arrangement(stock.label).symbol.sideMm, dotsPerInch, diameterMm })
}

/**
 * The permanent label of one cylinder: whose it is and what its collar says, nothing of what is in it.
 *
 * A marking of contents would have to come off when they change (49 CFR 172.303(a)); it belongs on the contents tag.
 *
 * Shape: drawn for the size of the stock's labels; a small one says less, never smaller than can be read.
 * Units: millimetres.
 * Errors: RangeError where no symbol fits; ask `symbolFit` before.
 */
export function identityLabel(content: IdentityLabelContent, fitting: Fitting): IdentityLabel {
  const { width, height } = fitting.stock.label
  const { form, symbol, text } = arrangement(fitting.stock.label)
  const words = form === 'full' ? fullText(content, text) : form === 'medium' ? mediumText(content, text) : smallText(content, text)
  return { code: content.code, width, height, strokes: [], ...words, qr: placedSymbol(content.payload, symbol, fitting) }
}
