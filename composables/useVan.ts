import { v7 as uuidv7 } from 'uuid'
import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useLoaded } from '~~/composables/useLoaded'
import { useNotice } from '~~/composables/useNotice'
import { useFirmRulesStore } from '~~/stores/firmRules'
import { usePostingStore } from '~~/stores/posting'
import { usePreferencesStore } from '~~/stores/preferences'
import { useSessionStore } from '~~/stores/session'
import type { VanAnswer } from '~~/utils/contract/vans'
import { formatReading, type MassReading } from '~~/utils/quantity/mass'

/**
 * One van: what is aboard, and saying what else it carries. Without an id there is none.
 *
 * Shape: `asked` and `sheet` are handed whole to `BaseLoaded` and `VanSheet`.
 */
export function useVan(id: () => string | null) {
  const api = useApi()
  const posting = usePostingStore()
  const preferences = usePreferencesStore()
  const rules = useFirmRulesStore()
  const session = useSessionStore()
  const { busy, problem: sayProblem, attempt } = useAttempt()
  const { toast, say } = useNotice()

  useLoaded('firm-rules', () => rules.load())
  const request = useLoaded('one-van', async () => id() === null ? null : api.get<VanAnswer>(`/api/vans/${id()}`), [id, () => posting.recorded])

  async function sayMaterials(said: { gross: MassReading, note: string }) {
    const done = await attempt(() => api.post(`/api/vans/${id()}/materials`, { id: uuidv7(), ...said }))
    if (!done) return
    say(`Carried beside cylinders: ${formatReading(said.gross)}.`)
    await request.refresh()
  }

  const asked = computed(() => ({
    data: request.data.value,
    problem: request.problem.value,
    text: 'Looking up what is aboard',
    onRetry: () => request.refresh(),
  }))
  const sheet = computed(() => ({
    unit: preferences.unit,
    timeZone: rules.timeZone,
    mayRecord: session.mayI('events:post'),
    busy: busy.value,
    onSay: sayMaterials,
  }))

  return { data: request.data, asked, sheet, sayProblem, toast }
}
