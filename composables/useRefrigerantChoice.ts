import { useApi } from '~~/composables/useApi'
import { usePreferencesStore } from '~~/stores/preferences'
import type { CylinderView } from '~~/utils/contract/custody'
import type { RefrigerantsAnswer } from '~~/utils/contract/refrigerants'

/** Which refrigerants may be asked about for an empty cylinder: the person's last few, with what it would take of each, and all. */
export function useRefrigerantChoice(isEmpty: Ref<boolean>) {
  const api = useApi()
  const route = useRoute('c-ref')
  const preferences = usePreferencesStore()

  const request = useAsyncData(() => `choice-${String(route.params.ref)}`, async () => {
    if (!isEmpty.value) return null
    const [list, recent] = await Promise.all([
      api.get<RefrigerantsAnswer>('/api/refrigerants'),
      Promise.all(preferences.recentRefrigerants.map(async refrigerant => ({
        refrigerant,
        capacity: (await api.get<CylinderView>(`/api/cylinders/${encodeURIComponent(String(route.params.ref))}`, { refrigerant }).catch(() => null))?.capacity ?? null,
      }))),
    ])
    return { all: list.items.map(line => line.designation), recent }
  }, { watch: [isEmpty] })

  return { ready: request as PromiseLike<unknown>, choice: request.data }
}
