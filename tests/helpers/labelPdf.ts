import { readFile } from 'node:fs/promises'
import { facesFrom } from '../../server/utils/pdf/fonts'
import { labelSheetPdf } from '../../server/utils/pdf/labelSheetPdf'
import type { IdentityLabelContent, LabelledStamp } from '../../utils/label/identityContent'
import { identityLabel } from '../../utils/label/identityLabel'
import { usualPrinter, type LabelPrinter } from '../../utils/label/printer'
import { sheet } from '../../utils/label/sheet'
import { LABEL_STOCKS, type LabelStockId } from '../../utils/label/stock'

/** The faces of the papers, read from the folder that the build takes them from. */
export const fonts = await facesFrom(file => readFile(new URL(`../../server/assets/fonts/${file}`, import.meta.url)))

/** The collar of an invented cylinder. */
export const STAMP: LabelledStamp = {
  serial: 'K48213', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: '27.9 lb', waterCapacity: '47.7 lb',
}

/** What the symbol of a code holds in these tests. */
export function payloadOf(code: string): string {
  return `HTTPS://CYLINDERS.EXAMPLE/C/${code}`
}

interface Changes { start?: number, compress?: boolean, changes?: Partial<IdentityLabelContent>, printer?: LabelPrinter }

/** The printed labels of some codes, all alike but for what `changes` says. */
export function labelPdf(
  codes: string[], stockId: LabelStockId,
  { start, compress, changes, printer = usualPrinter(LABEL_STOCKS[stockId]) }: Changes = {},
): Promise<Buffer> {
  const stock = LABEL_STOCKS[stockId]
  const labels = codes.map(code => identityLabel({
    code, payload: payloadOf(code), owner: 'Acme Cooling', telephone: '555 0142', copy: 1, stamp: STAMP, ...changes,
  }, { stock, dotsPerInch: printer.dotsPerInch, diameterMm: null }))
  return labelSheetPdf(sheet(labels, stock, start, printer), fonts, { compress })
}
