import { defineStore } from 'pinia'
import { v7 as uuidv7 } from 'uuid'
import { ApiError, problemOf, useApi } from '~~/composables/useApi'
import { useDevice } from '~~/composables/useDevice'
import type { CylinderView, EventResult, EventsAnswer } from '~~/utils/contract/custody'
import { MOST_EVENTS } from '~~/utils/contract/mostEvents'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { EventKind } from '~~/utils/custody/kinds'
import { KIND_WORDS } from '~~/utils/custody/words'
import { isoWithOffset } from '~~/utils/quantity/instant'

/** An event as a form has it, before it is given its id and its place in the device's count. */
export type NewEvent<K extends EventKind = EventKind> = Omit<CustodyEvent<K>, 'id' | 'deviceId' | 'deviceSeq'>

/** What was recorded, and the cylinder as it now stands. */
export interface Posted { event: CustodyEvent, version: number, cylinder: CylinderView | null }

/** What became of an event that was sent: recorded, or refused with a problem. */
export type Settled = { event: CustodyEvent } & ({ posted: Posted, problem: null } | { posted: null, problem: ProblemDetails })

const NOTICE_MS = 10_000
const NOT_TAKEN_BACK: readonly EventKind[] = ['registered', 'corrected']

/** The present instant as this device's clock has it, with its offset. */
export function deviceNow(ms = Date.now()): string {
  return isoWithOffset(ms, -new Date(ms).getTimezoneOffset())
}

/** The one way from the screens to the custody log. */
export const usePostingStore = defineStore('posting', () => {
  const api = useApi()
  const notice = ref('')
  /** What was recorded last and may still be taken back; null where nothing is. */
  const last = shallowRef<Posted[] | null>(null)
  /** The events that were last taken back. */
  const takenBackIds = ref<string[]>([])
  const busy = ref(false)
  /** Goes up with each event recorded here; a page that shows a cylinder asks for it again. */
  const recorded = ref(0)
  let timer: ReturnType<typeof setTimeout> | undefined

  /** Gives an event its id and its number on this device; from then on sending it twice records it once. */
  function seal<K extends EventKind>(event: NewEvent<K>): CustodyEvent<K> {
    const device = useDevice()
    return { ...event, id: uuidv7(), deviceId: device.id(), deviceSeq: device.nextSeq() }
  }

  /** Errors: ApiError where the server was not reached or refused the event; it is then still its author's. */
  async function post(event: CustodyEvent): Promise<Posted> {
    const [settled] = await postAll([event])
    if (settled!.problem) throw new ApiError(settled!.problem)
    return settled!.posted!
  }

  /**
   * Records several events, all in one request as far as one takes them.
   *
   * Shape: what became of each, in their order; `each` is told of every request's as soon as it is answered.
   * Errors: ApiError where the server was not reached; what `each` was told of before that is recorded.
   */
  async function postAll(events: readonly CustodyEvent[], each: (settled: Settled[]) => void = () => {}): Promise<Settled[]> {
    busy.value = true
    try {
      const all: Settled[] = []
      for (let from = 0; from < events.length; from += MOST_EVENTS) {
        const some = events.slice(from, from + MOST_EVENTS)
        const answer = await api.post<EventsAnswer>('/api/events', { events: some, deviceNow: deviceNow() })
        const settled = some.map(event => settledBy(answer, event))
        if (settled.some(({ posted }) => posted !== null)) recorded.value++
        all.push(...settled)
        each(settled)
      }
      return all
    }
    finally {
      busy.value = false
    }
  }

  /** Says on every screen what was recorded, and offers for ten seconds to take it back. */
  function announce(posted: Posted) {
    announceAll([posted], `Recorded: ${KIND_WORDS[posted.event.kind].done.toLowerCase()}`)
  }

  /** The same for what was recorded together, in one text. */
  function announceAll(posted: Posted[], text: string) {
    say(text)
    if (posted.length === 0 || posted.some(({ event }) => NOT_TAKEN_BACK.includes(event.kind))) return
    last.value = posted
  }

  /** Takes back what was just recorded, each by an event of its own: the log loses nothing. */
  async function takeBack(): Promise<void> {
    const taken = last.value
    if (!taken) return
    clear()
    try {
      const settled = await postAll(taken.map(({ event, version }) => seal<'corrected'>({
        cylinderId: event.cylinderId,
        kind: 'corrected',
        occurredAt: deviceNow(),
        expects: version,
        details: { eventId: event.id, reason: 'taken back at once' },
      }) as CustodyEvent))
      takenBackIds.value = taken.filter((_, at) => settled[at]!.posted !== null).map(({ event }) => event.id)
      const refusal = settled.find(({ problem }) => problem !== null)?.problem
      say(refusal
        ? notTakenBack(refusal, takenBackIds.value.length, taken.length)
        : taken.length === 1
          ? 'Taken back. Both lines stay in the custody log.'
          : `All ${taken.length} taken back. Every line stays in the custody log.`)
    }
    catch (error) {
      say(notTakenBack(problemOf(error), 0, taken.length))
    }
  }

  function say(text: string) {
    clear()
    notice.value = text
    timer = setTimeout(clear, NOTICE_MS)
  }

  function clear() {
    clearTimeout(timer)
    notice.value = ''
    last.value = null
  }

  return { notice, last, takenBackIds, busy, recorded, seal, post, postAll, announce, announceAll, takeBack, say, clear }
})

function settledBy(answer: EventsAnswer, event: CustodyEvent): Settled {
  const result: EventResult | undefined = answer.results.find(each => each.id === event.id)
  if (result?.outcome === 'refused' && result.problem) return { event, posted: null, problem: result.problem }
  if (result?.version === undefined) return { event, posted: null, problem: problemOf(undefined) }
  const cylinder = answer.cylinders.find(each => each.id === event.cylinderId) ?? null
  return { event, posted: { event, version: result.version, cylinder }, problem: null }
}

function notTakenBack(problem: ProblemDetails, done: number, all: number): string {
  const why = problem.status === 409
    ? `Something was recorded after ${all === 1 ? 'it. Correct it from its line' : 'the others. Correct each from its line'} in the custody log.`
    : `Not taken back: ${problem.detail || problem.title}`
  return done > 0 ? `${done} of ${all} taken back. ${why}` : why
}
