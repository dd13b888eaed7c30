import { defineStore } from 'pinia'
import { useApi } from '~~/composables/useApi'
import type { PolicyAnswer } from '~~/utils/contract/policy'

/** How long a screen goes by what it was told: a rule that somebody sets meanwhile is known by then. */
const KEPT_MS = 60_000

/** The firm's dated rules, its time zone and its scales. Asked for again once they are a minute old. */
export const useFirmRulesStore = defineStore('firm-rules', () => {
  const api = useApi()
  const policy = ref<PolicyAnswer | null>(null)
  const askedAt = ref(0)
  const timeZone = computed(() => policy.value?.timeZone ?? 'UTC')
  let asking: Promise<PolicyAnswer> | null = null

  /** The rules as last told. Errors: only where none were ever told; without a connection the last ones count on. */
  async function load(): Promise<PolicyAnswer> {
    const kept = policy.value
    if (kept && Date.now() - askedAt.value < KEPT_MS) return kept
    asking ??= refresh().finally(() => {
      asking = null
    })
    return asking.catch((error: unknown) => {
      if (kept) return kept
      throw error
    })
  }

  /** The rules as they are now. Errors: as of the API. */
  async function refresh(): Promise<PolicyAnswer> {
    const told = await api.get<PolicyAnswer>('/api/policy')
    policy.value = told
    askedAt.value = Date.now()
    return told
  }

  return { policy, askedAt, timeZone, load, refresh }
})
