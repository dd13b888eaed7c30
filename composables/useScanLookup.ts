import { problemOf, useApi } from '~~/composables/useApi'
import { useCopyOf } from '~~/composables/useCopyOf'
import { useScanSignal } from '~~/composables/useScanSignal'
import { usePreferencesStore } from '~~/stores/preferences'
import type { CylinderView } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { formatLabelCode } from '~~/utils/label/code'
import type { StatusKind } from '~~/utils/picture/status'
import { contentsWord, verdictOfScan } from '~~/utils/picture/verdict'

/**
 * What a scanned code leads to: a cylinder, none, or it could not be asked. `copyOf` tells of when the phone's copy is that
 * it comes from; it is left out where the server has said it.
 */
export type Scanned = { code: string, copyOf?: number } & (
  | { is: 'known', view: CylinderView }
  | { is: 'unknown' }
  | { is: 'failed', problem: ProblemDetails }
)

const SAME_CODE_MS = 3_000
const MOST_RECENT = 4

/**
 * Looks a scanned code up, says with a tone how it came out, and keeps the last few. The phone's own copy answers first, the
 * server then confirms it or shows what has changed.
 *
 * Shape: `start` and `end` are called around each look-up, but not for a code that is only read again. `changedFrom` is what
 * the copy had said where the server says something else.
 */
export function useScanLookup(on: { start: () => void, end: () => void }) {
  const api = useApi()
  const nuxt = useNuxtApp()
  const copyOf = useCopyOf()
  const preferences = usePreferencesStore()
  const signal = useScanSignal()

  const looking = ref<string | null>(null)
  const outcome = ref<Scanned | null>(null)
  const changedFrom = ref<string | null>(null)
  const recent = ref<{ code: string, kind: StatusKind, text: string }[]>([])
  // Vue does not need to know: nothing is drawn from these.
  let lastCode = ''
  let lastAt = 0
  let scans = 0

  const verdict = computed(() => outcome.value?.is === 'known' ? verdictOfScan(outcome.value.view, preferences.unit) : null)
  const spoken = computed(() => {
    const at = outcome.value
    if (!at) return ''
    const name = formatLabelCode(at.code)
    const changed = changedFrom.value === null ? '' : ', changed'
    if (at.is === 'known') return `${name}${changed}, ${contentsWord(at.view)}, ${verdict.value!.text}`
    return at.is === 'unknown' ? `${name}${changed}, on no cylinder` : `${name}, ${at.problem.title}`
  })
  const before = computed(() => recent.value.filter(each => each.code !== outcome.value?.code))

  onMounted(() => void nuxt.$readyCopy())

  async function look(code: string) {
    if (code === lastCode && Date.now() - lastAt < SAME_CODE_MS) return
    // A stop stands until it was seen, for a hand scanner too, which the paused camera does not hold back.
    if (verdict.value?.kind === 'stop') return signal('stop')
    lastCode = code
    lastAt = Date.now()
    const mine = ++scans
    changedFrom.value = null
    on.start()
    looking.value = code
    const told = fromServer(code)
    try {
      const first = await firstOf(fromCopy(code), told)
      if (mine === scans) settle(first)
    }
    finally {
      if (mine === scans) looking.value = null
      on.end()
    }
    const last = await told
    if (mine === scans && outcome.value?.code === code) confirm(last)
  }

  async function fromServer(code: string): Promise<Scanned> {
    try {
      return { is: 'known', code, view: await api.getFresh<CylinderView>(`/api/cylinders/${code}`) }
    }
    catch (error) {
      const problem = problemOf(error)
      return problem.status === 404 ? { is: 'unknown', code } : { is: 'failed', code, problem }
    }
  }

  /** What the phone's copy says; null where it has nothing to say. */
  async function fromCopy(code: string): Promise<Scanned | null> {
    try {
      const kept = await nuxt.$answerFromCopy(`/api/cylinders/${code}`)
      return kept && { is: 'known', code, view: kept.answer as CylinderView, copyOf: kept.of }
    }
    catch (error) {
      const { data, of } = Object(error) as { data?: ProblemDetails, of?: number }
      return data?.status === 404 ? { is: 'unknown', code, copyOf: of } : null
    }
  }

  function settle(result: Scanned, isNews = true) {
    outcome.value = result
    const kind = verdict.value?.kind ?? (result.is === 'unknown' ? 'unk' : 'att')
    if (isNews) signal(kind)
    if (result.is !== 'failed') {
      recent.value = [{ code: result.code, kind, text: wordOf(result) }, ...recent.value.filter(each => each.code !== result.code)].slice(0, MOST_RECENT)
    }
  }

  /** The server's word on what the copy has answered. Where it was not reached the copy's stands. */
  function confirm(last: Scanned) {
    const shown = outcome.value
    if (shown?.copyOf === undefined) return
    if (last.is === 'failed') {
      copyOf.value = shown.copyOf
      return
    }
    copyOf.value = null
    const isChanged = said(shown) !== said(last)
    if (isChanged) changedFrom.value = wordOf(shown)
    settle(last, isChanged)
  }

  function wordOf(scanned: Scanned): string {
    if (scanned.is !== 'known') return 'on no cylinder'
    const { text } = verdictOfScan(scanned.view, preferences.unit)
    return `${contentsWord(scanned.view)}, ${text.slice(0, 1).toLowerCase()}${text.slice(1)}`
  }

  /** All that the screen says of it. */
  function said(scanned: Scanned): string {
    if (scanned.is !== 'known') return scanned.is
    const { capacity, requalification, place, holder } = scanned.view
    return JSON.stringify([
      verdictOfScan(scanned.view, preferences.unit), contentsWord(scanned.view), capacity.exactStopWeightGrams, capacity.governingRule, requalification.dueMonth, place?.id, holder?.id,
    ])
  }

  /** The same code is looked up anew when it is read again. */
  function forget() {
    outcome.value = null
    changedFrom.value = null
    looking.value = null
    lastCode = ''
    scans++
  }

  return { looking, outcome, changedFrom, verdict, spoken, recent, before, look, forget }
}

/** The first word on a code: the copy's where it knows the cylinder, else the server's, else whatever the copy has. */
async function firstOf(copy: Promise<Scanned | null>, server: Promise<Scanned>): Promise<Scanned> {
  const first = await Promise.race([copy.then(kept => kept?.is === 'known' ? kept : server), server])
  return first.is === 'failed' ? await copy ?? first : first
}
