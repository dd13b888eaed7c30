import { defineStore } from 'pinia'
import { useApi } from '~~/composables/useApi'
import type { PolicyAnswer } from '~~/utils/contract/custody'

/** The firm's dated rules, its time zone and its scales. Asked for once. */
export const useFirmRulesStore = defineStore('firm-rules', () => {
  const api = useApi()
  const policy = ref<PolicyAnswer | null>(null)
  const timeZone = computed(() => policy.value?.timeZone ?? 'UTC')

  async function load(): Promise<PolicyAnswer> {
    policy.value ??= await api.get<PolicyAnswer>('/api/policy')
    return policy.value
  }

  return { policy, timeZone, load }
})
