import type { Ref } from 'vue'
import { useLoaded } from '~~/composables/useLoaded'
import { useFirmRulesStore } from '~~/stores/firmRules'
import type { FirmRule, PolicyAnswer } from '~~/utils/contract/policy'
import { ruleHistory, type StandingRule } from '~~/utils/rules/ruleHistory'

const ASK_AGAIN_MS = 1_000

/** The firm's rules as they stand now, by kind; asked for again for as long as rows of the fleet are still to follow them. */
export function useFirmRules(now: Readonly<Ref<number>>) {
  const store = useFirmRulesStore()
  const loaded = useLoaded<PolicyAnswer>('firm-rules-now', refreshed)
  let timer: ReturnType<typeof setTimeout> | undefined

  const histories = computed(() => {
    const rules = loaded.data.value?.rules ?? []
    // A rule that was set this moment has begun, whatever the minute of the clock on the screen.
    const at = Math.max(now.value, loaded.data.value?.asOf ?? 0)
    const [fill, retest] = [ruleHistory(rules, 'fill-policy', at), ruleHistory(rules, 'retest', at)]
    return { fill, retest, fillInForce: inForce(fill), retestInForce: inForce(retest) }
  })

  /** As they are now; without an answer as last told, so that a lost connection does not close the form above them. */
  async function refreshed(): Promise<PolicyAnswer> {
    try {
      return await store.refresh()
    }
    catch (error) {
      if (store.policy) return { ...store.policy }
      throw error
    }
  }

  onMounted(() => watch(loaded.data, (policy) => {
    clearTimeout(timer)
    if (policy && policy.rowsBehind > 0) timer = setTimeout(() => void loaded.refresh(), ASK_AGAIN_MS)
  }, { immediate: true }))
  onBeforeUnmount(() => clearTimeout(timer))

  return { policy: loaded.data, policyProblem: loaded.problem, refresh: loaded.refresh, histories }
}

function inForce(history: readonly StandingRule[]): FirmRule | null {
  return history.find(({ standing }) => standing === 'in-force')?.rule ?? null
}
