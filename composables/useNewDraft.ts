import { v7 as uuidv7 } from 'uuid'
import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { queryList } from '~~/utils/address/queryText'

/** Makes the draft of a shipment or of a test lot and opens its page; sent again for want of signal, it makes no second. */
export function useNewDraft(kind: 'shipments' | 'test-lots', pages: string) {
  const api = useApi()
  const route = useRoute()
  const { busy, problem, attempt } = useAttempt()
  let draftId = uuidv7()

  /** Ids of the cylinders chosen on another page. */
  const chosen = computed(() => queryList(route.query, 'with'))

  /** Says what is still to be chosen. */
  function refuse(title: string, detail: string) {
    problem.value = { type: 'about:blank', title, status: 422, detail }
  }

  async function make(draft: object) {
    const isMade = await attempt(async () => {
      const made = await api.post<{ id: string }>(`/api/${kind}`, { id: draftId, ...draft })
      await navigateTo(`${pages}/${made.id}`)
    })
    // What the server refused is another draft once it is put right; what never reached it is the same.
    if (!isMade && problem.value?.status !== 0) draftId = uuidv7()
  }

  return { chosen, busy, problem, refuse, make }
}
