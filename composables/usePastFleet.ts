import type { Ref } from 'vue'
import { useApi } from '~~/composables/useApi'
import { useClock } from '~~/composables/useClock'
import type { FleetQuery } from '~~/utils/contract/custody'
import type { PastProgress } from '~~/utils/contract/past'
import type { CylinderRow } from '~~/utils/custody/cylinderView'
import { cylinderPath } from '~~/utils/fleet/cylinderPath'
import type { AskedPast } from '~~/utils/picture/pastWords'
import { isoWithOffset } from '~~/utils/quantity/instant'

const LOOK_EVERY_MS = 700

/** The fleet's page in the past: choosing an instant, how far its fleet is made while one waits, and where its rows lead. */
export function usePastFleet(
  past: Readonly<Ref<AskedPast | null>>, waiting: Readonly<Ref<boolean>>, change: (next: Partial<Record<keyof FleetQuery, string | null>>) => unknown,
) {
  const api = useApi()
  const now = useClock()
  const isAsking = ref(false)
  const progress = ref<PastProgress | null>(null)
  const latest = computed(() => import.meta.client ? isoWithOffset(now.value, -new Date(now.value).getTimezoneOffset()).slice(0, 16) : '')
  const query = computed(() => Object.fromEntries(Object.entries(past.value ?? {}).filter((part): part is [string, string] => part[1] !== null)))

  let timer: ReturnType<typeof setTimeout> | undefined
  async function look() {
    if (!waiting.value || past.value === null) return
    progress.value = await api.get<PastProgress>('/api/fleet/as-it-stood', query.value).catch(() => null)
    timer = setTimeout(() => void look(), LOOK_EVERY_MS)
  }
  onMounted(() => watch([waiting, past], () => {
    clearTimeout(timer)
    progress.value = null
    if (waiting.value && past.value) timer = setTimeout(() => void look(), LOOK_EVERY_MS)
  }, { immediate: true }))
  onBeforeUnmount(() => clearTimeout(timer))

  function choose(next: AskedPast) {
    isAsking.value = false
    return change({ asOf: next.asOf, knownAt: next.knownAt })
  }

  function leave() {
    return change({ asOf: null, knownAt: null })
  }

  /** A row's page: in the past the cylinder as it stood then. */
  function pathOf(row: CylinderRow): string {
    return past.value === null ? cylinderPath(row) : `${cylinderPath(row)}/as-it-stood?${new URLSearchParams(query.value)}`
  }

  return { isAsking, latest, progress, choose, leave, pathOf }
}
