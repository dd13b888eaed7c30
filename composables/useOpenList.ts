import { useApi } from '~~/composables/useApi'
import type { OpenList, OpenListAnswer } from '~~/utils/contract/custody'

/** The open shipment or test lot that a cylinder stands on; null where it stands on none, or while that is not known. */
export function useOpenList(cylinderId: () => string | null) {
  const api = useApi()
  const list = shallowRef<OpenList | null>(null)
  onMounted(() => watch(cylinderId, async (id) => {
    list.value = id === null ? null : await api.get<OpenListAnswer>(`/api/cylinders/${id}/open-list`).then(answer => answer.list, () => null)
  }, { immediate: true }))
  return list
}
