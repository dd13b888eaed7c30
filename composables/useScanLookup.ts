import { problemOf, useApi } from '~~/composables/useApi'
import { useScanSignal } from '~~/composables/useScanSignal'
import { usePreferencesStore } from '~~/stores/preferences'
import type { CylinderView } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { formatLabelCode } from '~~/utils/label/code'
import type { StatusKind } from '~~/utils/picture/status'
import { contentsWord, verdictOfScan } from '~~/utils/picture/verdict'

/** What a scanned code leads to: a cylinder, none, or it could not be asked. */
export type Scanned
  = | { is: 'known', code: string, view: CylinderView }
    | { is: 'unknown', code: string }
    | { is: 'failed', code: string, problem: ProblemDetails }

const SAME_CODE_MS = 3_000
const MOST_RECENT = 4

/**
 * Looks a scanned code up, says with a tone how it came out, and keeps the last few.
 *
 * Shape: `start` and `end` are called around each look-up, but not for a code that is only read again.
 */
export function useScanLookup(on: { start: () => void, end: () => void }) {
  const api = useApi()
  const preferences = usePreferencesStore()
  const signal = useScanSignal()

  const looking = ref<string | null>(null)
  const outcome = ref<Scanned | null>(null)
  const recent = ref<{ code: string, kind: StatusKind, text: string }[]>([])
  // Vue does not need to know: nothing is drawn from these.
  let lastCode = ''
  let lastAt = 0

  const verdict = computed(() => outcome.value?.is === 'known' ? verdictOfScan(outcome.value.view, preferences.unit) : null)
  const spoken = computed(() => {
    const at = outcome.value
    if (!at) return ''
    const name = formatLabelCode(at.code)
    if (at.is === 'known') return `${name}, ${contentsWord(at.view)}, ${verdict.value!.text}`
    return at.is === 'unknown' ? `${name}, on no cylinder` : `${name}, ${at.problem.title}`
  })
  const before = computed(() => recent.value.filter(each => each.code !== outcome.value?.code))

  async function look(code: string) {
    if (code === lastCode && Date.now() - lastAt < SAME_CODE_MS) return
    // A stop stands until it was seen, for a hand scanner too, which the paused camera does not hold back.
    if (verdict.value?.kind === 'stop') return signal('stop')
    lastCode = code
    lastAt = Date.now()
    on.start()
    looking.value = code
    try {
      const view = await api.get<CylinderView>(`/api/cylinders/${code}`)
      settle({ is: 'known', code, view })
    }
    catch (error) {
      const problem = problemOf(error)
      settle(problem.status === 404 ? { is: 'unknown', code } : { is: 'failed', code, problem })
    }
    finally {
      looking.value = null
      on.end()
    }
  }

  function settle(result: Scanned) {
    outcome.value = result
    const kind = verdict.value?.kind ?? (result.is === 'unknown' ? 'unk' : 'att')
    signal(kind)
    const text = result.is === 'known' ? `${contentsWord(result.view)}, ${verdict.value!.text.toLowerCase()}` : 'on no cylinder'
    if (result.is !== 'failed') {
      recent.value = [{ code: result.code, kind, text }, ...recent.value.filter(each => each.code !== result.code)].slice(0, MOST_RECENT)
    }
  }

  /** The same code is looked up anew when it is read again. */
  function forget() {
    outcome.value = null
    lastCode = ''
  }

  return { looking, outcome, verdict, spoken, recent, before, look, forget }
}
