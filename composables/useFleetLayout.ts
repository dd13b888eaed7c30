import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useLoaded } from '~~/composables/useLoaded'
import { FIRST_LAYOUT, type FleetLayout } from '~~/utils/contract/fleetLayout'

/** How this person has the table of the fleet, kept on the server so that it is the same on each of their screens. */
export function useFleetLayout() {
  const api = useApi()
  const kept = useLoaded('fleet-layout', () => api.get<FleetLayout>('/api/fleet/layout'))
  const isChoosing = ref(false)
  const { busy, problem, attempt } = useAttempt()

  const layout = computed(() => kept.data.value ?? FIRST_LAYOUT)

  /** Keeps another layout; the choice stays open where it was not kept. */
  async function keep(next: FleetLayout) {
    const isKept = await attempt(async () => {
      kept.data.value = await api.put<FleetLayout>('/api/fleet/layout', next)
    })
    if (isKept) isChoosing.value = false
  }

  return { layout, isChoosing, busy, problem, keep }
}
