import { useApi } from '~~/composables/useApi'
import { useOutboxStore } from '~~/stores/outbox'
import { usePostingStore } from '~~/stores/posting'
import type { CylinderView } from '~~/utils/contract/custody'
import { formatLabelCode, normaliseLabelCode } from '~~/utils/label/code'

/**
 * The cylinder that this page's address names, as it stands for the refrigerant asked about; asked for again after
 * each event recorded here.
 *
 * Shape: `page` is its own address, by its present label code, else by its id.
 */
export function useCylinder(enabled: () => boolean = () => true) {
  const api = useApi()
  const route = useRoute('c-ref')
  const posting = usePostingStore()
  const outbox = useOutboxStore()

  const ref_ = computed(() => String(route.params.ref))
  const asked = computed(() => typeof route.query.refrigerant === 'string' ? route.query.refrigerant : null)
  const code = computed(() => normaliseLabelCode(ref_.value))

  let turn = 0

  const request = useAsyncData(
    () => `cylinder-${ref_.value}-${asked.value ?? ''}`,
    async () => {
      if (!enabled()) return null
      const mine = ++turn
      return await api.get<CylinderView>(
        `/api/cylinders/${encodeURIComponent(ref_.value)}`,
        asked.value ? { refrigerant: asked.value } : undefined,
        // What waits here is in the copy's answer, and not in the server's.
        later => mine === turn && outbox.pendingOf(later.id).length === 0 && show(later),
      )
    },
    { watch: [() => posting.recorded] },
  )

  function show(later: CylinderView): true {
    request.data.value = later
    return true
  }

  const { data: view, error, status, refresh } = request
  const name = computed(() => {
    const label = view.value?.labelCode ?? code.value
    return label ? formatLabelCode(label) : view.value?.stamp?.serial ?? 'Cylinder'
  })
  /** The name in a heading: a code is not broken over two lines. */
  const wholeName = computed(() => name.value.replaceAll(' ', '\u00A0'))
  const page = computed(() => `/c/${(view.value?.labelCode ?? view.value?.id ?? ref_.value).toLowerCase()}`)
  /** The code in the address, where it is one that was replaced. */
  const oldCode = computed(() => code.value && view.value && code.value !== view.value.labelCode && view.value.oldLabelCodes.includes(code.value) ? code.value : null)

  return { ready: request as PromiseLike<unknown>, view, error, status, refresh, name, wholeName, page, code, oldCode, asked }
}
