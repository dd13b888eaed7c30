import { v7 as uuidv7 } from 'uuid'
import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useLoaded } from '~~/composables/useLoaded'
import { useNotice } from '~~/composables/useNotice'
import { useFirmRulesStore } from '~~/stores/firmRules'
import { usePostingStore } from '~~/stores/posting'
import type { VanAnswer } from '~~/utils/contract/vans'
import { formatReading, type MassReading } from '~~/utils/quantity/mass'

/** One van: what is aboard, and saying what else it carries. Without an id there is none. */
export function useVan(id: () => string | null) {
  const api = useApi()
  const posting = usePostingStore()
  const rules = useFirmRulesStore()
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

  return { ...request, busy, sayProblem, toast, sayMaterials }
}
