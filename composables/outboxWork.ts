import type { Ref } from 'vue'
import { deviceNow } from '~~/composables/deviceNow'
import { outboxBox } from '~~/composables/outboxBox'
import { sendOutbox, type Ended, type Told } from '~~/composables/outboxSender'
import { mayWait, noteWaiting } from '~~/composables/outboxWaits'
import { ApiError } from '~~/composables/useApi'
import { useDevice } from '~~/composables/useDevice'
import { whileAnswered } from '~~/composables/whileAnswered'
import type { CylinderView, EventsAnswer } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'
import { waitAfter } from '~~/utils/outbox/backOff'
import type { DroppedEntry, OutboxEntry, RecordedEntry } from '~~/utils/outbox/entry'
import { exportedOutbox } from '~~/utils/outbox/exported'
import type { Pause } from '~~/utils/outbox/settlement'

/** How long a form waits for an answer on one event, and how much longer for each that is sent with it. Units: milliseconds. Our choice. */
const [FORM_WAITS_MS, MORE_FOR_EACH_MS] = [3_000, 50]

/** What became of an event that was to be sent at once. */
export type Verdict = { is: 'recorded', version: number, cylinder: CylinderView | null } | { is: 'refused', problem: ProblemDetails } | { is: 'waiting' }

/** What of the outbox is shown, kept by `stores/outbox.ts`. */
export interface ShownOutbox {
  personId: Readonly<Ref<string | null>>
  all: Ref<OutboxEntry[]>
  entries: Readonly<Ref<OutboxEntry[]>>
  waiting: Readonly<Ref<OutboxEntry[]>>
  dropped: Ref<DroppedEntry[]>
  pause: Ref<Pause | null>
  busy: Ref<boolean>
  arrived: Ref<number>
  isRead: Ref<boolean>
}

/** What is done with the outbox. */
export type OutboxWork = ReturnType<typeof outboxWork>

/**
 * All that is done with the outbox: fetched when it is first needed, so that no page waits for it.
 *
 * @param tell the other tabs that it has changed, and whether something was recorded.
 */
export function outboxWork(state: ShownOutbox, tell: (recorded: boolean) => void) {
  const box = outboxBox()
  let timer: ReturnType<typeof setTimeout> | undefined
  let failures = 0
  let runs = 0

  /** Reads what waits, and sends what may go. */
  async function attend(): Promise<void> {
    await reread()
    if (state.waiting.value.length > 0) await run(false)
    else state.pause.value = null
  }

  async function reread(): Promise<void> {
    try {
      state.all.value = await box.all()
      state.isRead.value = true
      noteWaiting(state.all.value.length > 0)
      if (state.pause.value === 'storage') state.pause.value = null
    }
    catch {
      if (mayWait()) state.pause.value = 'storage'
    }
  }

  /**
   * Keeps events on the device and numbers them in its count; gives them as they will be sent.
   *
   * Errors: an ApiError that says so where they are not kept; the form then keeps what was typed.
   */
  async function put(events: readonly CustodyEvent[]): Promise<CustodyEvent[]> {
    const author = state.personId.value
    if (author === null) throw new ApiError({ type: 'not-signed-in', title: 'Not signed in', status: 401, detail: 'Sign in first.' })
    noteWaiting(true)
    const device = useDevice()
    // What a form holds is drawn from; the store takes it as it is sent.
    const kept = await box.put(JSON.parse(JSON.stringify(events)) as CustodyEvent[], author, Date.now(), device.counted())
    device.note(Math.max(...kept.map(({ deviceSeq }) => deviceSeq)))
    // Shown once it is known whether it waits: what is recorded at once is not announced as waiting before.
    schedule({ is: 'wait', untilMs: Date.now() })
    return kept
  }

  /** Numbers events that are not kept here, each once. Where the device keeps nothing they are counted by themselves. */
  async function number(events: readonly CustodyEvent[]): Promise<CustodyEvent[]> {
    const device = useDevice()
    const missing = events.filter(({ deviceSeq }) => deviceSeq === 0).length
    if (missing === 0) return [...events]
    const given = await box.numbers(missing, device.counted()).catch(() => countBySelf(missing))
    device.note(Math.max(...given))
    return events.map(event => event.deviceSeq === 0 ? { ...event, deviceSeq: given.shift()! } : event)
  }

  async function changed(recorded = false) {
    await reread()
    tell(recorded)
  }

  /** Sends all that waits of the person who is signed in, the newest too. */
  async function flush(): Promise<void> {
    await run(true)
  }

  /**
   * Sends these and what waits before them; gives what became of each. `each` hears of them request by request. Where no
   * answer comes in time, the rest waits like any other entry while the sending goes on.
   */
  async function sendNow(ids: readonly string[], each: (verdicts: ReadonlyMap<string, Verdict>) => void = () => {}): Promise<Map<string, Verdict>> {
    const verdicts = new Map<string, Verdict>()
    const hear = (some: ReadonlyMap<string, Verdict>) => {
      for (const [id, verdict] of some) verdicts.set(id, verdict)
      if (some.size > 0) each(some)
    }
    const isDone = await whileAnswered<Told>(
      FORM_WAITS_MS + (ids.length - 1) * MORE_FOR_EACH_MS,
      told => run(true, told),
      told => hear(new Map([...verdictsOf(told)].filter(([id]) => ids.includes(id)))),
    )
    if (!isDone) await changed()
    const rest = ids.filter(id => !verdicts.has(id))
    if (rest.length > 0) hear(await elsewhere(rest))
    return verdicts
  }

  /** What became of events that another tab may have sent. */
  async function elsewhere(ids: readonly string[]): Promise<Map<string, Verdict>> {
    const recorded = await box.recorded().catch(() => [])
    return new Map(ids.map((id): [string, Verdict] => {
      const done = recorded.find(entry => entry.id === id)
      if (done) return [id, { is: 'recorded', version: done.version, cylinder: null }]
      const entry = state.all.value.find(each => each.id === id)
      return [id, entry?.state === 'refused' && entry.problem ? { is: 'refused', problem: entry.problem } : { is: 'waiting' }]
    }))
  }

  async function run(byHand: boolean, told: (told: Told) => void = () => {}): Promise<void> {
    const author = state.personId.value
    if (author === null) return
    if (!navigator.onLine) {
      state.pause.value = 'offline'
      await changed()
      return
    }
    if (state.busy.value && !byHand) return
    state.busy.value = ++runs > 0
    clearTimeout(timer)
    let recorded = false
    try {
      const ended = await sendOutbox(box, author, {
        byHand,
        deviceNow,
        told: (one) => {
          recorded ||= one.settlement.recorded.length > 0
          told(one)
        },
      })
      follow(ended)
    }
    catch {
      follow({ is: 'paused', pause: 'storage' })
    }
    finally {
      state.busy.value = --runs > 0
    }
    await changed(recorded)
    if (recorded) state.arrived.value++
  }

  function follow(ended: Ended) {
    state.pause.value = ended.is === 'paused' ? ended.pause : null
    failures = ended.is === 'paused' ? failures + 1 : 0
    schedule(ended)
  }

  /** When it is looked again by itself. Without a network, or with nobody to send as, what changes that is waited for. */
  function schedule(ended: Ended) {
    clearTimeout(timer)
    if (ended.is === 'done' || (ended.is === 'paused' && ended.pause === 'sign-in')) return
    timer = setTimeout(() => void run(false), ended.is === 'wait' ? Math.max(0, ended.untilMs - Date.now()) : waitAfter(failures))
  }

  /** Takes events out that were never sent: all of them, or none. */
  async function takeOut(ids: readonly string[]): Promise<boolean> {
    const isOut = await box.takeOut(ids)
    await changed()
    return isOut
  }

  /** Gives a refused entry up; the reason stays with it on this device. False where another tab has done with it meanwhile. */
  async function drop(id: string, reason: string): Promise<boolean> {
    const isDropped = await box.drop(id, reason, Date.now())
    await changed()
    await loadDropped()
    return isDropped
  }

  /** Takes refused entries away: the form that shows them has them again, or they were recorded anew. */
  async function giveBack(ids: readonly string[]): Promise<void> {
    await box.giveBack(ids)
    await changed()
  }

  async function loadDropped(): Promise<void> {
    state.dropped.value = (await box.dropped()).filter(entry => entry.personId === state.personId.value)
  }

  /** The person's own entries as a file. */
  async function exportFile(): Promise<Blob> {
    // Where the storage answers no more, what is shown can still be saved.
    await loadDropped().catch(() => {})
    const content = exportedOutbox(state.personId.value ?? '', state.entries.value, state.dropped.value, deviceNow())
    return new Blob([JSON.stringify(content, null, 2)], { type: 'application/json' })
  }

  /** What of this person's events was recorded last from this device. */
  async function recordedLately(): Promise<RecordedEntry[]> {
    const recorded = await box.recorded().catch(() => [])
    return recorded.filter(entry => entry.personId === state.personId.value)
  }

  return { attend, reread, put, number, sendNow, flush, takeOut, drop, giveBack, loadDropped, recordedLately, exportFile }
}

function verdictsOf({ settlement, answer }: Told): Map<string, Verdict> {
  const cylinders = 'body' in answer ? (Object(answer.body) as Partial<EventsAnswer>).cylinders ?? [] : []
  return new Map<string, Verdict>([
    ...settlement.recorded.map(({ id, version, cylinderId }): [string, Verdict] =>
      [id, { is: 'recorded', version, cylinder: cylinders.find(each => each.id === cylinderId) ?? null }]),
    ...settlement.refused.map(({ id, problem }): [string, Verdict] => [id, { is: 'refused', problem }]),
  ])
}

/** Numbers without the store of the device, one tab at a time. */
async function countBySelf(many: number): Promise<number[]> {
  const device = useDevice()
  const take = () => {
    const from = device.counted()
    device.note(from + many)
    return Array.from({ length: many }, (_, at) => from + at + 1)
  }
  return navigator.locks ? await navigator.locks.request('collarbook-device-count', take) : take()
}
