import { problemOf, useApi } from '~~/composables/useApi'
import { useLoaded } from '~~/composables/useLoaded'
import { useFirmRulesStore } from '~~/stores/firmRules'
import { deviceNow, usePostingStore, type Settled } from '~~/stores/posting'
import type { CountersigningAnswer } from '~~/utils/contract/countersigning'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'

const ENTRIES_AT_ONCE = 200

/**
 * What waits for this person's signature, and the signing of what is ticked.
 *
 * Shape: `cylinder` is the one that is asked about, null for all; `ticked` are ids of entries, `refusals` say by id why
 * one was not signed.
 */
export function useCountersigning(cylinder: () => string | null) {
  const api = useApi()
  const rules = useFirmRulesStore()
  const posting = usePostingStore()
  const ticked = ref<ReadonlySet<string>>(new Set())
  const refusals = ref<ReadonlyMap<string, string>>(new Map())
  const problem = ref<ProblemDetails | null>(null)
  // What was sent and may have arrived goes out again as the same event.
  const sealed = new Map<string, CustodyEvent>()

  const waiting = useLoaded(`countersigning-${cylinder() ?? 'all'}`, async () => {
    const [answer] = await Promise.all([
      api.get<CountersigningAnswer>('/api/countersigning', { limit: ENTRIES_AT_ONCE, ...(cylinder() && { cylinder: cylinder() }) }),
      rules.load(),
    ])
    return answer
  }, [() => posting.recorded])

  const items = computed(() => waiting.data.value?.items ?? [])
  const chosen = computed(() => items.value.filter(({ line }) => ticked.value.has(line.id)))

  function tick(entryId: string, isTicked: boolean) {
    ticked.value = new Set([...ticked.value].filter(id => id !== entryId).concat(isTicked ? entryId : []))
  }

  function tickAll(areTicked: boolean) {
    ticked.value = new Set(areTicked ? items.value.map(({ line }) => line.id) : [])
  }

  async function sign(): Promise<void> {
    problem.value = null
    refusals.value = new Map()
    const events = chosen.value.map(({ cylinder: { id }, line }) => sealedFor(id, line.id))
    if (events.length === 0) return
    try {
      settle(await posting.postAll(events))
    }
    catch (error) {
      problem.value = problemOf(error)
    }
  }

  function sealedFor(cylinderId: string, eventId: string): CustodyEvent {
    const known = sealed.get(eventId)
    if (known) return known
    const event = posting.seal<'countersigned'>({ cylinderId, kind: 'countersigned', occurredAt: deviceNow(), details: { eventId } }) as CustodyEvent
    sealed.set(eventId, event)
    return event
  }

  function settle(settled: readonly Settled[]) {
    const entryOf = ({ event }: Settled) => (event as CustodyEvent<'countersigned'>).details.eventId
    for (const one of settled) sealed.delete(entryOf(one))
    refusals.value = new Map(settled.flatMap(one => one.problem ? [[entryOf(one), one.problem.detail || one.problem.title]] : []))
    ticked.value = new Set()
    const posted = settled.flatMap(one => one.posted ?? [])
    if (posted.length > 0) posting.announceAll(posted, posted.length === 1 ? 'Countersigned' : `${posted.length} entries countersigned`)
  }

  return { waiting, items, ticked, chosen, refusals, problem, tick, tickAll, sign }
}
