import { errorAt, useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useLoaded } from '~~/composables/useLoaded'
import type { useNotice } from '~~/composables/useNotice'
import type { FleetView, FleetViewsAnswer } from '~~/utils/contract/fleetViews'

/** The views of the fleet that this person named: saving, renaming, and removing with a way back. */
export function useFleetViews(notice: ReturnType<typeof useNotice>) {
  const api = useApi()
  const kept = useLoaded('fleet-views', () => api.get<FleetViewsAnswer>('/api/fleet/views'))
  const naming = ref<'new' | 'rename' | null>(null)
  const { busy, problem, attempt } = useAttempt()

  const views = computed(() => kept.data.value?.items ?? [])
  const problemText = computed(() => problem.value && (errorAt(problem.value, 'name') ?? problem.value.detail))

  async function save(name: string, query: Record<string, string>) {
    if (!await attempt(() => api.post<FleetView>('/api/fleet/views', { name, query }))) return
    naming.value = null
    await kept.refresh()
  }

  async function rename(id: string, name: string) {
    if (!await attempt(() => api.patch<FleetView>(`/api/fleet/views/${id}`, { name }))) return
    naming.value = null
    await kept.refresh()
  }

  async function remove(view: FleetView) {
    if (!await attempt(() => api.del(`/api/fleet/views/${view.id}`))) {
      notice.say(problem.value?.detail ?? '')
      return
    }
    await kept.refresh()
    notice.say(`The view ${view.name} is removed.`, () => save(view.name, view.query))
  }

  // What was said against one name says nothing of the next.
  watch(naming, () => {
    problem.value = null
  })

  return { views, naming, busy, problemText, save, rename, remove }
}
