import { useKept } from '~~/composables/useKept'

/** Labels that were printed and of which none came back yet; kept in this tab until one did. */
export function usePrintJob() {
  const { restored, keep, forget } = useKept<{ codes: string[] }>('label-printing')
  const codes = ref<string[]>([])
  const scanned = ref<string | null>(null)

  watch(restored, (before) => {
    if (before && codes.value.length === 0) codes.value = before.codes
  })

  const isOpen = computed(() => codes.value.length > 0)

  function begin(printed: readonly string[]) {
    codes.value = [...printed]
    scanned.value = null
    keep({ codes: codes.value })
  }

  /** One that comes back closes the job; another is only named. */
  function scan(code: string) {
    scanned.value = code
    if (codes.value.includes(code)) forget()
  }

  function end() {
    codes.value = []
    scanned.value = null
    forget()
  }

  return { codes, scanned, isOpen, begin, scan, end }
}
