import { useApi } from '~~/composables/useApi'
import { useFirmRulesStore } from '~~/stores/firmRules'
import { usePostingStore } from '~~/stores/posting'
import type { CustodyLogAnswer, CylinderView, LogLine } from '~~/utils/contract/custody'
import type { CompositionRecordAnswer, RefrigerantRecordAnswer } from '~~/utils/contract/refrigerants'

const LINES_AT_ONCE = 200

/**
 * What a cylinder's sum rests on beside the cylinder itself: its whole log, the firm's rules, and what is known of the
 * refrigerant; null where the catalogue has none of this name.
 */
export function useWorking(view: Ref<CylinderView | null | undefined>) {
  const api = useApi()
  const rules = useFirmRulesStore()
  const posting = usePostingStore()
  const about = computed(() => view.value?.capacity.forRefrigerant ?? null)

  async function wholeLog(id: string): Promise<LogLine[]> {
    const lines: LogLine[] = []
    let cursor: string | null = null
    do {
      const page: CustodyLogAnswer = await api.getFresh<CustodyLogAnswer>(`/api/cylinders/${id}/events`, { limit: LINES_AT_ONCE, ...cursor === null ? {} : { cursor } })
      lines.push(...page.items)
      cursor = page.nextCursor
    } while (cursor !== null)
    return lines
  }

  return useAsyncData(() => `working-${view.value?.id}-${about.value ?? ''}`, async () => {
    if (!view.value) return null
    const [lines, policy, refrigerant] = await Promise.all([
      wholeLog(view.value.id),
      rules.load(),
      about.value ? api.get<RefrigerantRecordAnswer | CompositionRecordAnswer>(`/api/refrigerants/${encodeURIComponent(about.value)}`).catch(() => null) : null,
    ])
    return { lines, policy, refrigerant }
  }, { watch: [() => posting.recorded], deep: false })
}
