import { defineStore } from 'pinia'
import { v7 as uuidv7 } from 'uuid'
import { deviceNow } from '~~/composables/deviceNow'
import type { Verdict } from '~~/composables/outboxWork'
import { ApiError, problemOf, useApi } from '~~/composables/useApi'
import { useDevice } from '~~/composables/useDevice'
import { useOutboxStore } from '~~/stores/outbox'
import { useSessionStore } from '~~/stores/session'
import type { CylinderView, EventResult, EventsAnswer } from '~~/utils/contract/custody'
import { MOST_EVENTS } from '~~/utils/contract/mostEvents'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { EventKind } from '~~/utils/custody/kinds'
import { KIND_WORDS } from '~~/utils/custody/words'
import { NEEDS_SERVER, needsServer } from '~~/utils/outbox/needsServer'
import { savedWords } from '~~/utils/outbox/words'

export { deviceNow }

/** An event as a form has it, before it is given its id. */
export type NewEvent<K extends EventKind = EventKind> = Omit<CustodyEvent<K>, 'id' | 'deviceId' | 'deviceSeq'>

/**
 * What was recorded, and the cylinder as it now stands; `isQueued` where it is saved on this device and waits to be sent,
 * and has no version yet.
 */
export interface Posted { event: CustodyEvent, version: number | null, cylinder: CylinderView | null, isQueued?: true }

/** What became of an event that was sent: recorded or waiting to be, or refused with a problem. */
export type Settled = { event: CustodyEvent } & ({ posted: Posted, problem: null } | { posted: null, problem: ProblemDetails })

const NOTICE_MS = 10_000
const NOT_TAKEN_BACK: readonly EventKind[] = ['registered', 'corrected']

/** The one way from the screens to the custody log. */
export const usePostingStore = defineStore('posting', () => {
  const api = useApi()
  const outbox = useOutboxStore()
  const session = useSessionStore()
  const notice = ref('')
  /** What was recorded last and may still be taken back; null where nothing is. */
  const last = shallowRef<Posted[] | null>(null)
  /** The events that were last taken back. */
  const takenBackIds = ref<string[]>([])
  const busy = ref(false)
  /** Goes up with what is recorded or saved here; a page that shows a cylinder asks for it again. */
  const recorded = ref(0)
  let timer: ReturnType<typeof setTimeout> | undefined
  /** What was sent without being kept, by id: sent again it has the same number. */
  const numbers = new Map<string, number>()

  watch(() => outbox.arrived, () => recorded.value++, { flush: 'sync' })

  /** Gives an event its id; from then on sending it twice records it once. It is numbered when it is kept or sent. */
  function seal<K extends EventKind>(event: NewEvent<K>): CustodyEvent<K> {
    return { ...event, id: uuidv7(), deviceId: useDevice().id(), deviceSeq: 0 }
  }

  /** Errors: ApiError where the event was refused, or neither recorded nor saved; it is then still its author's. */
  async function post(event: CustodyEvent, takesRefusals?: () => boolean): Promise<Posted> {
    const [settled] = await postAll([event], undefined, takesRefusals)
    if (settled!.problem) throw new ApiError(settled!.problem)
    return settled!.posted!
  }

  /**
   * Records several events: each is on this device before it is sent, and stays there until the server has said what
   * became of it.
   *
   * Shape: what became of each, in their order; `each` is told of every request's as soon as it is answered;
   * `takesRefusals` whether the caller has what was refused: else it stays on the device as such.
   * Errors: ApiError where they could not be saved, or need a server that was not reached; what `each` was told of
   * before that is recorded.
   */
  async function postAll(
    events: readonly CustodyEvent[], each: (settled: Settled[]) => void = () => {}, takesRefusals: () => boolean = () => true,
  ): Promise<Settled[]> {
    busy.value = true
    try {
      return events.some(needsServer) ? await postAtOnce(events, each) : await postByOutbox(events, each, takesRefusals)
    }
    finally {
      busy.value = false
    }
  }

  async function postByOutbox(events: readonly CustodyEvent[], each: (settled: Settled[]) => void, takesRefusals: () => boolean): Promise<Settled[]> {
    let kept: CustodyEvent[]
    try {
      kept = await outbox.put(events)
    }
    catch (error) {
      if (!navigator.onLine || problemOf(error).type !== 'storage') throw error
      // What was not kept here may still be recorded, where there is a server.
      return postAtOnce(events, each).catch((unsent) => {
        throw problemOf(unsent).status === 0 ? error : unsent
      })
    }
    const all = new Map<string, Settled>()
    const take = async (verdicts: ReadonlyMap<string, Verdict>) => {
      const some = await Promise.all(kept.filter(({ id }) => verdicts.has(id)).map(event => settledBy(event, verdicts.get(event.id)!)))
      for (const settled of some) all.set(settled.event.id, settled)
      each(some)
    }
    const heard: Promise<void>[] = []
    const verdicts = await outbox.sendNow(kept.map(({ id }) => id), some => heard.push(take(some)))
    await Promise.all(heard)
    const refused = [...verdicts].filter(([, { is }]) => is === 'refused').map(([id]) => id)
    if (refused.length > 0 && takesRefusals()) await outbox.giveBack(refused).catch(() => {})
    // Where the session has ended, asking for the cylinder again would lead away from what was just said.
    if (outbox.pause !== 'sign-in' && [...all.values()].some(({ posted }) => posted?.isQueued)) recorded.value++
    return kept.map(({ id }) => all.get(id)!)
  }

  async function settledBy(event: CustodyEvent, verdict: Verdict): Promise<Settled> {
    if (verdict.is === 'refused') return { event, posted: null, problem: verdict.problem }
    if (verdict.is === 'recorded') return { event, posted: { event, version: verdict.version, cylinder: verdict.cylinder }, problem: null }
    return { event, posted: { event, version: null, cylinder: await asItWillStand(event.cylinderId), isQueued: true }, problem: null }
  }

  /** The cylinder by this device's copy with what waits on top of it; null where the device has none. */
  async function asItWillStand(cylinderId: string): Promise<CylinderView | null> {
    try {
      const { offlineAnswer } = await import('~~/composables/offlineAnswers')
      return await offlineAnswer(`/api/cylinders/${cylinderId}`) as CylinderView | undefined ?? null
    }
    catch {
      return null
    }
  }

  /** Sends without keeping: what decides on a cylinder as it stands now does not wait. What waits goes before it. */
  async function postAtOnce(events: readonly CustodyEvent[], each: (settled: Settled[]) => void): Promise<Settled[]> {
    if (!navigator.onLine && events.some(needsServer)) throw new ApiError(NEEDS_SERVER)
    if (outbox.waiting.length > 0) await outbox.flush()
    // Whoever has signed in in another tab meanwhile records nothing of this person's.
    const author = session.user?.id
    const numbered = await outbox.number(events.map(event => ({ ...event, deviceSeq: numbers.get(event.id) ?? event.deviceSeq })))
    for (const { id, deviceSeq } of numbered) numbers.set(id, deviceSeq)
    const all: Settled[] = []
    for (let from = 0; from < numbered.length; from += MOST_EVENTS) {
      const some = numbered.slice(from, from + MOST_EVENTS)
      const answer = await api.post<EventsAnswer>('/api/events', { events: some, deviceNow: deviceNow(), author })
      const settled = some.map(event => settledAtOnce(answer, event))
      if (settled.some(({ posted }) => posted !== null)) recorded.value++
      all.push(...settled)
      each(settled)
    }
    return all
  }

  /** Says on every screen what was recorded, and offers for ten seconds to take it back. */
  function announce(posted: Posted) {
    announceAll([posted], `Recorded: ${KIND_WORDS[posted.event.kind].done.toLowerCase()}`)
  }

  /** The same for what was recorded together, in one text. */
  function announceAll(posted: Posted[], text: string) {
    const queued = posted.filter(({ isQueued }) => isQueued)
    say(queued.length > 0 ? savedWords(queued.map(({ event }) => event)) : text)
    if (posted.length === 0 || posted.some(({ event }) => NOT_TAKEN_BACK.includes(event.kind))) return
    last.value = posted
  }

  /**
   * Takes back what was just recorded, each by an event of its own: the log loses nothing. What was never sent is taken
   * out of the outbox.
   */
  async function takeBack(): Promise<void> {
    const taken = last.value
    if (!taken) return
    clear()
    try {
      if (taken.every(({ isQueued }) => isQueued) && await outbox.takeOut(taken.map(({ event }) => event.id))) {
        takenBackIds.value = taken.map(({ event }) => event.id)
        await forgetPhotosOf(taken)
        recorded.value++
        say(taken.length === 1 ? 'Taken back before it was sent.' : `All ${taken.length} taken back before they were sent.`)
        return
      }
      const arrived = await arrivedOf(taken)
      if (arrived === null) {
        say(taken.some(({ event }) => outbox.refused.some(({ id }) => id === event.id))
          ? 'It was refused, so it is not recorded. Mend it or drop it where it waits.'
          : 'Not taken back: it may have been sent, and the server was not reached. Correct it in the custody log later.')
        return
      }
      const settled = await postAll(arrived.map(({ event, version }) => seal<'corrected'>({
        cylinderId: event.cylinderId,
        kind: 'corrected',
        occurredAt: deviceNow(),
        expects: version!,
        details: { eventId: event.id, reason: 'taken back at once' },
      }) as CustodyEvent))
      takenBackIds.value = arrived.filter((_, at) => settled[at]!.posted !== null).map(({ event }) => event.id)
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

  /** No event names them any more. */
  async function forgetPhotosOf(taken: readonly Posted[]) {
    const ids = taken.flatMap(({ event }) => event.photoIds ?? [])
    if (ids.length === 0) return
    const { usePhotosStore } = await import('~~/stores/photos')
    const photos = usePhotosStore()
    for (const id of ids) await photos.remove(id)
  }

  /** These as the log has them; null where that is not known of one. */
  async function arrivedOf(taken: readonly Posted[]): Promise<Posted[] | null> {
    const queued = taken.filter(({ isQueued }) => isQueued).map(({ event }) => event.id)
    if (queued.length === 0) return [...taken]
    const verdicts = await outbox.sendNow(queued)
    const known = taken.map((one) => {
      const verdict = verdicts.get(one.event.id)
      return verdict?.is === 'recorded' ? { ...one, version: verdict.version } : one
    })
    return known.every(({ version }) => version !== null) ? known : null
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

function settledAtOnce(answer: EventsAnswer, event: CustodyEvent): Settled {
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
