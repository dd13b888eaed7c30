import { useApi } from '~~/composables/useApi'
import { useLabelPrinter } from '~~/composables/useLabelPrinter'
import { useLoaded } from '~~/composables/useLoaded'
import type { FirmCard } from '~~/utils/contract/firm'
import type { LabelAddress } from '~~/utils/contract/labels'
import { labelsPdfPath, testPagePath } from '~~/utils/contract/printing'
import { symbolWords } from '~~/utils/document/labelWords'
import { labelUrl } from '~~/utils/label/code'
import { identityLabel, symbolFit, type Fitting } from '~~/utils/label/identityLabel'
import { LABEL_STOCKS } from '~~/utils/label/stock'

// Any sound code serves as an example.
const EXAMPLE_CODE = '7K3M9Q2TX'

/** How the labels of these codes are printed on this device, how the first of them looks blank, and where their PDF is. */
export function usePrintSetting(codes: Ref<readonly string[]>, mayPrint: () => boolean) {
  const api = useApi()
  const { stock, printer } = useLabelPrinter()
  const firm = useLoaded('firm-on-label', () => api.get<FirmCard>('/api/firm/card'))
  const address = useLoaded('label-address', async () => mayPrint() ? await api.get<LabelAddress>('/api/labels/address') : null)

  const start = ref(1)
  const diameterMm = ref<number | null>(null)
  const withAdvice = ref(false)

  const code = computed(() => codes.value[0] ?? EXAMPLE_CODE)
  const here = useRequestURL().origin
  const payload = computed(() => labelUrl(address.data.value?.publicUrl ?? here, code.value))
  const fitting = computed<Fitting>(() => ({ stock: LABEL_STOCKS[stock.value], dotsPerInch: printer.value.dotsPerInch, diameterMm: diameterMm.value }))
  const fit = computed(() => symbolFit(payload.value, fitting.value))
  const words = computed(() => symbolWords(fit.value, diameterMm.value))
  /** null where the symbol would not be read. */
  const picture = computed(() => 'moduleMm' in fit.value
    ? identityLabel({
        code: code.value, payload: payload.value, owner: firm.data.value?.name ?? '', telephone: firm.data.value?.telephone ?? null, copy: 1, stamp: null,
      }, fitting.value)
    : null)
  const pdf = computed(() => picture.value && labelsPdfPath(codes.value, {
    stock: stock.value, start: start.value, printer: printer.value, diameterMm: diameterMm.value, withAdvice: withAdvice.value,
  }))
  const testPage = computed(() => testPagePath(stock.value, printer.value))

  watch(stock, () => {
    start.value = 1
    withAdvice.value = false
  })

  return { stock, printer, start, diameterMm, withAdvice, address, words, picture, pdf, testPage }
}
