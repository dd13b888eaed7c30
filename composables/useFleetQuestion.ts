import { useApi } from '~~/composables/useApi'
import { useLoaded } from '~~/composables/useLoaded'
import { usePast } from '~~/composables/usePast'
import { useRefreshOnFocus } from '~~/composables/useRefreshOnFocus'
import type { FleetAnswer, FleetQuery, FleetSummary } from '~~/utils/contract/custody'
import type { PeopleAnswer } from '~~/utils/contract/people'
import type { FirmsAnswer, PlacesAnswer } from '~~/utils/contract/places'
import { changeFleetAddress, fleetRequest, readFleetAddress, type AddressQuery } from '~~/utils/fleet/fleetAddress'
import { filtersInWords } from '~~/utils/fleet/filterWords'
import { addMonths } from '~~/utils/quantity/month'

/** What is asked of the fleet, which stands in the page's address, with its answer and the names it is asked by. */
export function useFleetQuestion() {
  const api = useApi()
  const route = useRoute()

  const query = computed(() => readFleetAddress(route.query as AddressQuery))
  const address = computed(() => changeFleetAddress(route.query as AddressQuery, {}))
  const { past, asked } = usePast()
  // A fleet of the past may take its time: the browser asks for it, and shows how far it has come.
  const isLater = () => import.meta.server && past.value !== null
  const fleet = useLoaded('fleet', async () => isLater() ? null : await api.get<FleetAnswer>('/api/cylinders', fleetRequest(query.value)), [query])
  const summary = useLoaded('fleet-summary', async () => isLater() ? null : await api.get<FleetSummary>('/api/fleet/summary', asked.value), [() => JSON.stringify(asked.value)])
  const places = useLoaded('places-in-use', () => api.get<PlacesAnswer>('/api/places', { active: 'true' }))
  const people = useLoaded('people-in-use', () => api.get<PeopleAnswer>('/api/people', { active: 'true' }))
  const firms = useLoaded('firms-in-use', () => api.get<FirmsAnswer>('/api/firms', { active: 'true' }))

  const names = computed(() => ({ places: places.data.value?.items ?? [], people: people.data.value?.items ?? [], firms: firms.data.value?.items ?? [] }))
  const filters = computed(() => filtersInWords(query.value, names.value))
  /** The month whose retests are shown, or that the late ones are. */
  const pickedMonth = computed(() => query.value.finding === 'retest-overdue' ? 'late' as const : query.value.dueBefore ? addMonths(query.value.dueBefore, -1) : null)

  function change(next: Partial<Record<keyof FleetQuery, string | null>>) {
    return navigateTo({ path: '/fleet', query: changeFleetAddress(route.query as AddressQuery, next) })
  }

  // What is full and away already has been shipped.
  function showFinding(finding: string | null) {
    return change({ finding, dueBefore: null, lifecycle: finding === 'nearly-full' ? 'in-service' : null })
  }

  function sortBy(next: { key: string, descending: boolean }) {
    return change({ sort: next.key === 'urgency' ? null : next.key, order: next.descending ? 'desc' : null })
  }

  function pickMonth(month: string) {
    if (pickedMonth.value === month) return change({ dueBefore: null, finding: null })
    return month === 'late'
      ? change({ finding: 'retest-overdue', dueBefore: null })
      : change({ dueBefore: addMonths(month, 1), finding: null, sort: 'due' })
  }

  function refresh() {
    void fleet.refresh()
    void summary.refresh()
  }

  // While the page is taken over from the server nothing is asked anew.
  onMounted(() => onNuxtReady(() => past.value !== null && !fleet.data.value && refresh()))
  // The past does not change while one looks away.
  useRefreshOnFocus(() => past.value === null && refresh())

  return { query, address, past, fleet, summary, names, filters, pickedMonth, change, showFinding, sortBy, pickMonth, refresh }
}
