import { useApi } from '~~/composables/useApi'
import type { BatchPlan } from '~~/composables/useBatch'
import { useLoaded } from '~~/composables/useLoaded'
import { useSessionStore } from '~~/stores/session'
import { supervisorsFor, usualSupervisorId } from '~~/utils/access/supervisors'
import { queryText } from '~~/utils/address/queryText'
import { batchActOf, type BatchAct } from '~~/utils/batch/batchAct'
import type { ExpectedCylinder } from '~~/utils/batch/missing'
import type { CylinderRow, CylinderView, FleetAnswer } from '~~/utils/contract/custody'
import type { PeopleAnswer } from '~~/utils/contract/people'
import type { PlacesAnswer } from '~~/utils/contract/places'
import type { VanAnswer } from '~~/utils/contract/vans'

const MOST_AT_ONCE = 200

/**
 * What a batch is for, as its address says: `act`, the `van` that is loaded or unloaded, where `to`, and against what:
 * all that stands `from` a place, or the codes and ids of `expect`.
 */
export function useBatchPlan() {
  const api = useApi()
  const route = useRoute()
  const session = useSessionStore()
  const chosenSupervisorId = ref<string | null>(null)

  const lists = useLoaded('batch-lists', async () => {
    const [places, people] = await Promise.all([
      api.get<PlacesAnswer>('/api/places', { active: true }),
      session.user?.trainee ? api.get<PeopleAnswer>('/api/people', { active: true }) : null,
    ])
    return {
      places: places.items,
      supervisors: people && supervisorsFor(people.items, session.user!.id),
      usualSupervisorId: usualSupervisorId(people?.items ?? [], session.user?.id ?? ''),
    }
  })
  const supervisorId = computed({
    get: () => chosenSupervisorId.value ?? lists.data.value?.usualSupervisorId ?? '',
    set: (next) => {
      chosenSupervisorId.value = next
    },
  })
  const places = computed(() => lists.data.value?.places ?? [])

  const act = computed<BatchAct>({ get: () => batchActOf(route.query.act), set: value => ask({ act: value, to: undefined, from: undefined, expect: undefined }) })
  const usesVan = computed(() => act.value === 'load' || act.value === 'unload')
  const van = computed({
    get: () => text('van') || places.value.find(({ technicianId }) => technicianId === session.user?.id)?.id || '',
    set: value => ask({ van: value }),
  })
  const shops = computed(() => places.value.filter(({ kind }) => kind === 'shop'))
  const to = computed({
    get: () => text('to') || (shops.value.length === 1 && act.value !== 'move' ? shops.value[0]!.id : ''),
    set: value => ask({ to: value }),
  })
  const from = computed({ get: () => text('from'), set: value => ask({ from: value }) })
  const target = computed(() => {
    const id = act.value === 'load' ? van.value : to.value
    return places.value.find(place => place.id === id) ?? null
  })

  const listedFrom = computed(() => act.value === 'unload' ? van.value : from.value)
  // Which van it is, where the address does not say, is known with the places: the server asks for what stands there too,
  // and the browser begins with the same.
  const expectedRequest = useLoaded<ExpectedCylinder[] | null>(`batch-expected ${act.value} ${text('van')}`, async () => {
    await lists.ready
    if (text('expect')) return Promise.all(text('expect').split(',').map(askedFor))
    return listedFrom.value ? standingAt(listedFrom.value) : null
  }, [listedFrom, () => route.query.expect])
  const vanRequest = useLoaded(`batch-van ${act.value} ${text('van')}`, async () => {
    await lists.ready
    return act.value === 'load' && van.value ? api.get<VanAnswer>(`/api/vans/${van.value}`) : null
  }, [van])

  const plan = computed<BatchPlan>(() => ({
    act: act.value,
    target: target.value,
    expected: expectedRequest.data.value ?? null,
    supervisorId: supervisorId.value || null,
  }))
  /** What is still to be chosen before anything can be recorded; null where nothing is. */
  const lacks = computed(() => {
    if (usesVan.value && van.value === '') return 'Choose the van.'
    if (!target.value) return 'Choose where they come to.'
    return session.user?.trainee && supervisorId.value === '' ? 'Choose who supervises.' : null
  })

  function text(name: string): string {
    return queryText(route.query, name)
  }

  function ask(changes: Record<string, string | undefined>) {
    void navigateTo({ query: { ...route.query, ...changes } }, { replace: true })
  }

  /** All that stands at a place: of a list cut short the rest would be called strangers. */
  async function standingAt(place: string): Promise<CylinderRow[]> {
    const all: CylinderRow[] = []
    let cursor: string | null = null
    do {
      const answer: FleetAnswer = await api.get<FleetAnswer>('/api/cylinders', { place, limit: MOST_AT_ONCE, cursor: cursor ?? undefined })
      all.push(...answer.items)
      cursor = answer.nextCursor
    } while (cursor !== null)
    return all
  }

  async function askedFor(reference: string): Promise<ExpectedCylinder> {
    const { id, labelCode, stamp, place, holder } = await api.get<CylinderView>(`/api/cylinders/${encodeURIComponent(reference)}`)
    return { id, labelCode, serial: stamp?.serial ?? null, place, holder }
  }

  return { lists, places, act, van, to, from, plan, lacks, supervisorId, expectedProblem: expectedRequest.problem, vanToLoad: vanRequest.data }
}
