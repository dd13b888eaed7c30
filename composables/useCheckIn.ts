import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useBatch } from '~~/composables/useBatch'
import { useEventIds } from '~~/composables/useEventIds'
import { useLoaded } from '~~/composables/useLoaded'
import { useSessionStore } from '~~/stores/session'
import { supervisorsFor, usualSupervisorId } from '~~/utils/access/supervisors'
import { isCounted } from '~~/utils/batch/batchLine'
import type { CylinderRow } from '~~/utils/contract/custody'
import type { PeopleAnswer } from '~~/utils/contract/people'
import type { PlacesAnswer } from '~~/utils/contract/places'
import type { VanAnswer } from '~~/utils/contract/vans'

/** What a check-in came to: by name what came off the van and what stays on it. What was at the shop already is neither. */
export interface CheckedIn { shopName: string, toShop: string[], aboard: string[], missing: CylinderRow[] }

/**
 * A van that returns, checked against what it should hold: what is scanned comes to the shop or stays aboard, and what
 * is not scanned is kept as to be looked for; all by one act.
 */
export function useCheckIn(vanId: string) {
  const api = useApi()
  const session = useSessionStore()
  const { busy, problem: keepProblem, attempt } = useAttempt()

  const shopId = ref('')
  const chosenSupervisorId = ref<string | null>(null)
  const stayingIds = ref(new Set<string>())
  const done = shallowRef<CheckedIn | null>(null)
  // The same under one id however often it is sent; what is found after all makes it another.
  const checkInId = useEventIds()
  /** Every cylinder that was scanned, by id; its name where it came with the van. */
  const found = new Map<string, string | null>()

  // As it was when the check began: what comes off the van meanwhile was still expected.
  const loaded = useLoaded(`check-in ${vanId}`, async () => {
    const [answer, places, people] = await Promise.all([
      api.get<VanAnswer>(`/api/vans/${vanId}`),
      api.get<PlacesAnswer>('/api/places', { active: true }),
      session.user?.trainee ? api.get<PeopleAnswer>('/api/people', { active: true }) : null,
    ])
    const shops = places.items.filter(({ kind }) => kind === 'shop' || kind === 'rack')
    return {
      answer,
      shops,
      supervisors: people && supervisorsFor(people.items, session.user!.id),
      usualSupervisorId: usualSupervisorId(people?.items ?? [], session.user?.id ?? ''),
    }
  })
  const supervisorId = computed({
    get: () => chosenSupervisorId.value ?? loaded.data.value?.usualSupervisorId ?? '',
    set: (next) => {
      chosenSupervisorId.value = next
    },
  })

  const van = computed(() => loaded.data.value?.answer.van ?? null)
  const expected = computed(() => loaded.data.value?.answer.aboard ?? [])
  const shops = computed(() => loaded.data.value?.shops ?? [])
  const shop = computed(() => shops.value.find(each => each.id === shopId.value) ?? (shops.value.length === 1 ? shops.value[0]! : null))

  const batch = useBatch(`check-in ${vanId}`, () => ({
    act: 'unload',
    target: shop.value,
    expected: expected.value,
    supervisorId: supervisorId.value || null,
    otherTarget: cylinderId => stayingIds.value.has(cylinderId) ? van.value : null,
  }))

  const missing = computed(() => {
    const ids = new Set(batch.missing.value.map(each => each.id))
    return expected.value.filter(each => ids.has(each.id))
  })
  /** Whether a line neither counts nor stands for a cylinder that is in the shop by the log already. */
  const unsettled = computed(() => batch.lines.value.some(line => !isCounted(line) && line.verdict?.standing !== 'there'))
  /** What is still to be chosen; null where nothing is. */
  const lacks = computed(() => {
    if (!shop.value) return 'Choose where they come to.'
    if (unsettled.value) return 'See to the lines of the list that do not count yet, or take them off.'
    return session.user?.trainee && supervisorId.value === '' ? 'Choose who supervises.' : null
  })

  function stay(cylinderId: string, stays: boolean) {
    const next = new Set(stayingIds.value)
    if (stays) next.add(cylinderId)
    else next.delete(cylinderId)
    stayingIds.value = next
  }

  async function checkIn() {
    if (lacks.value !== null || busy.value) return
    for (const { found: at, name, verdict } of batch.lines.value) {
      if (at.is === 'known') found.set(at.view.id, verdict?.standing === 'there' ? null : name)
    }
    const notFound = missing.value
    await batch.record()
    if (batch.problem.value || batch.counted.value.length > 0) return
    const said = { found: [...found.keys()], missing: notFound.map(each => each.id) }
    const kept = await attempt(() => api.post(`/api/vans/${vanId}/check-ins`, { id: checkInId(JSON.stringify(said)), ...said }))
    if (!kept) return
    batch.startOver()
    const came = (stays: boolean) => [...found].flatMap(([each, name]) => name !== null && stayingIds.value.has(each) === stays ? [name] : [])
    done.value = { shopName: shop.value!.name, toShop: came(false), aboard: came(true), missing: notFound }
  }

  return { loaded, batch, van, expected, shops, shop, shopId, supervisorId, stayingIds, stay, missing, lacks, busy, keepProblem, checkIn, done }
}
