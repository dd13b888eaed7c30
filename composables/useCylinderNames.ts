import { useApi } from '~~/composables/useApi'
import type { CylinderView } from '~~/utils/contract/custody'
import { formatLabelCode } from '~~/utils/label/code'

/** The names of cylinders by their ids, looked up one after another; whatever is not found has none. */
export function useCylinderNames(ids: () => readonly string[]) {
  const api = useApi()
  const names = shallowRef<ReadonlyMap<string, string>>(new Map())
  const asked = new Set<string>()

  onMounted(() => watch(() => [...new Set(ids())].join(), async () => {
    for (const id of ids()) {
      if (asked.has(id)) continue
      asked.add(id)
      const view = await api.getAside<CylinderView>(`/api/cylinders/${id}`).catch(() => null)
      const name = view?.labelCode ? formatLabelCode(view.labelCode) : view?.stamp?.serial
      if (name) names.value = new Map(names.value).set(id, name)
    }
  }, { immediate: true }))

  return names
}
