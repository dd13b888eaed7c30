import { offsetsFor, printerChoices, usualPrinter, type LabelPrinter } from '~~/utils/label/printer'
import { isLabelStockId, LABEL_STOCKS, type LabelStockId } from '~~/utils/label/stock'

const KEPT_FOR_SECONDS = 365 * 24 * 3600

interface Kept { stock: string, printers: Partial<Record<LabelStockId, LabelPrinter>> }

/** The stock that this device prints on, and for each stock the printer as it was set. Kept in a cookie. */
export function useLabelPrinter() {
  const kept = useCookie<Kept>('label-printer', {
    maxAge: KEPT_FOR_SECONDS, sameSite: 'strict', path: '/', default: () => ({ stock: 'roll-4x2', printers: {} }),
  })

  const stock = computed<LabelStockId>({
    get: () => isLabelStockId(kept.value.stock) ? kept.value.stock : 'roll-4x2',
    set: (next) => {
      kept.value = { ...kept.value, stock: next }
    },
  })
  const printer = computed<LabelPrinter>({
    get: () => sound(stock.value, kept.value.printers?.[stock.value]),
    set: (next) => {
      kept.value = { ...kept.value, printers: { ...kept.value.printers, [stock.value]: next } }
    },
  })

  return { stock, printer }
}

/** A cookie may be older than the stocks are. */
function sound(id: LabelStockId, kept: LabelPrinter | undefined): LabelPrinter {
  const stock = LABEL_STOCKS[id]
  const offsets = offsetsFor(stock)
  const isSound = kept && printerChoices(stock).includes(kept.dotsPerInch) && offsets.includes(kept.offset?.x) && offsets.includes(kept.offset?.y)
  return isSound ? kept : usualPrinter(stock)
}
