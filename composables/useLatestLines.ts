import { useApi } from '~~/composables/useApi'
import { useFirmRulesStore } from '~~/stores/firmRules'
import { usePostingStore } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import type { CustodyLogAnswer } from '~~/utils/contract/custody'

const LINES_SHOWN = 6

/** The newest lines of the log of the cylinder that this page's address names, with the firm's time zone to show them in. */
export function useLatestLines() {
  const api = useApi()
  const route = useRoute('c-ref')
  const session = useSessionStore()
  const rules = useFirmRulesStore()
  const posting = usePostingStore()

  let turn = 0

  const request = useAsyncData(() => `around-${String(route.params.ref)}`, async () => {
    if (!session.user) return null
    const mine = ++turn
    const [log] = await Promise.all([
      api.get<CustodyLogAnswer>(
        `/api/cylinders/${encodeURIComponent(String(route.params.ref))}/events`, { limit: LINES_SHOWN }, later => mine === turn && show(later),
      ).catch(() => null),
      rules.load(),
    ])
    return linesOf(log)
  }, { watch: [() => posting.recorded] })

  function show(later: CustodyLogAnswer): true {
    request.data.value = linesOf(later)
    return true
  }

  return { ready: request as PromiseLike<unknown>, latest: request.data }
}

function linesOf(log: CustodyLogAnswer | null) {
  return { lines: log?.items ?? [], total: log?.total ?? 0, isWithServer: log === null || log.isWithServer === true }
}
