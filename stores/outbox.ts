import { defineStore } from 'pinia'
import { deviceNow } from '~~/composables/deviceNow'
import { ApiError } from '~~/composables/useApi'
import { useDevice } from '~~/composables/useDevice'
import type { Ended, Told } from '~~/composables/outboxSender'
import { useSessionStore } from '~~/stores/session'
import type { CylinderView, EventsAnswer } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'
import { waitAfter } from '~~/utils/outbox/backOff'
import { inOrder, isWaiting, type DroppedEntry, type OutboxEntry, type RecordedEntry } from '~~/utils/outbox/entry'
import type { Pause } from '~~/utils/outbox/settlement'
import { OUTBOX_WAITS_KEY } from '~~/utils/outbox/waitKey'

/** What became of an event that was to be sent at once. */
export type Verdict = { is: 'recorded', version: number, cylinder: CylinderView | null } | { is: 'refused', problem: ProblemDetails } | { is: 'waiting' }

/** How long a visit without a sign of anything waiting goes on before it is looked for all the same. Units: milliseconds. */
const LOOK_AFTER_MS = 5_000

/** The events of this device that are not known to be recorded, and their way to the server. */
export const useOutboxStore = defineStore('outbox', () => {
  const session = useSessionStore()
  const all = shallowRef<OutboxEntry[]>([])
  const dropped = shallowRef<DroppedEntry[]>([])
  const pause = ref<Pause | null>(null)
  const busy = ref(false)
  /** Goes up when events of this device were recorded, from whichever of its tabs. */
  const arrived = ref(0)
  const personId = computed(() => session.user?.id ?? null)
  const entries = computed(() => inOrder(all.value.filter(entry => entry.personId === personId.value)))
  const waiting = computed(() => entries.value.filter(isWaiting))
  const refused = computed(() => entries.value.filter(entry => !isWaiting(entry)))
  const oldestAt = computed(() => entries.value.length === 0 ? null : Math.min(...entries.value.map(({ queuedAt }) => queuedAt)))
  const sealed = computed(() => all.value.length - entries.value.length)
  let machinery: Promise<Machinery> | null = null
  let channel: BroadcastChannel | null = null
  let timer: ReturnType<typeof setTimeout> | undefined
  let failures = 0
  let runs = 0
  let isRead = false

  /** The store of the device and the sender, fetched when they are first needed: no page waits for them. */
  async function machine(): Promise<Machinery> {
    machinery ??= load()
    try {
      return await machinery
    }
    catch (error) {
      machinery = null
      throw error
    }
  }

  /** Begins to look after what waits on this device; to be called once a page stands in the browser. */
  function start() {
    channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel('collarbook-outbox')
    channel?.addEventListener('message', ({ data }) => void hear(Object(data).recorded === true))
    window.addEventListener('online', () => void attend())
    window.addEventListener('offline', () => {
      pause.value = 'offline'
    })
    document.addEventListener('visibilitychange', () => {
      if (document.visibilityState === 'visible') void attend()
    })
    watch(personId, () => void attend())
    if (noted()) void attend()
    else setTimeout(() => void attend(), LOOK_AFTER_MS)
  }

  async function hear(recorded: boolean) {
    await reread()
    if (recorded) arrived.value++
  }

  /** Reads what waits, and sends what may go. */
  async function attend(): Promise<void> {
    await reread()
    if (waiting.value.length > 0) await run(false)
    else pause.value = null
  }

  /** Reads what waits, where it was not read yet. */
  async function read(): Promise<void> {
    if (!isRead) await reread()
  }

  async function reread(): Promise<void> {
    try {
      const { box } = await machine()
      all.value = await box.all()
      isRead = true
      note(all.value.length > 0)
      if (pause.value === 'storage') pause.value = null
    }
    catch {
      if (noted()) pause.value = 'storage'
    }
  }

  /**
   * Keeps events on the device and numbers them in its count; gives them as they will be sent.
   *
   * Errors: an ApiError that says so where they are not kept; the form then keeps what was typed.
   */
  async function put(events: readonly CustodyEvent[]): Promise<CustodyEvent[]> {
    const author = personId.value
    if (author === null) throw new ApiError({ type: 'not-signed-in', title: 'Not signed in', status: 401, detail: 'Sign in first.' })
    note(true)
    const { box } = await machine()
    const device = useDevice()
    // What a form holds is drawn from; the store takes it as it is sent.
    const kept = await box.put(JSON.parse(JSON.stringify(events)) as CustodyEvent[], author, Date.now(), device.counted())
    device.note(Math.max(...kept.map(({ deviceSeq }) => deviceSeq)))
    await changed()
    schedule({ is: 'wait', untilMs: Date.now() })
    return kept
  }

  /** Numbers events that are not kept here, each once. Where the device keeps nothing they are counted by themselves. */
  async function number(events: readonly CustodyEvent[]): Promise<CustodyEvent[]> {
    const device = useDevice()
    const missing = events.filter(({ deviceSeq }) => deviceSeq === 0).length
    if (missing === 0) return [...events]
    const given = await machine().then(({ box }) => box.numbers(missing, device.counted())).catch(() => countBySelf(missing))
    device.note(Math.max(...given))
    return events.map(event => event.deviceSeq === 0 ? { ...event, deviceSeq: given.shift()! } : event)
  }

  async function changed(recorded = false) {
    await reread()
    channel?.postMessage({ recorded })
  }

  /** Sends all that waits of the person who is signed in, the newest too. */
  async function flush(): Promise<void> {
    await run(true)
  }

  /** Sends these and what waits before them; gives what became of each. `each` hears of them request by request. */
  async function sendNow(ids: readonly string[], each: (verdicts: ReadonlyMap<string, Verdict>) => void = () => {}): Promise<Map<string, Verdict>> {
    const verdicts = new Map<string, Verdict>()
    await run(true, (told) => {
      const mine = new Map([...verdictsOf(told)].filter(([id]) => ids.includes(id)))
      for (const [id, verdict] of mine) verdicts.set(id, verdict)
      if (mine.size > 0) each(mine)
    })
    const rest = ids.filter(id => !verdicts.has(id))
    if (rest.length > 0) {
      const found = await elsewhere(rest)
      for (const [id, verdict] of found) verdicts.set(id, verdict)
      each(found)
    }
    const back = [...verdicts].filter(([, verdict]) => verdict.is === 'refused').map(([id]) => id)
    if (back.length > 0) await machine().then(({ box }) => box.giveBack(back)).then(() => changed(), () => {})
    return verdicts
  }

  /** What became of events that another tab may have sent. */
  async function elsewhere(ids: readonly string[]): Promise<Map<string, Verdict>> {
    const recorded = await machine().then(({ box }) => box.recorded()).catch(() => [])
    return new Map(ids.map((id): [string, Verdict] => {
      const done = recorded.find(entry => entry.id === id)
      if (done) return [id, { is: 'recorded', version: done.version, cylinder: null }]
      const entry = all.value.find(each => each.id === id)
      return [id, entry?.state === 'refused' && entry.problem ? { is: 'refused', problem: entry.problem } : { is: 'waiting' }]
    }))
  }

  async function run(byHand: boolean, told: (told: Told) => void = () => {}): Promise<void> {
    const author = personId.value
    if (author === null) return
    if (!navigator.onLine) {
      pause.value = 'offline'
      return
    }
    if (busy.value && !byHand) return
    busy.value = ++runs > 0
    clearTimeout(timer)
    let recorded = false
    try {
      const { box, sendOutbox } = await machine()
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
      busy.value = --runs > 0
    }
    await changed(recorded)
    if (recorded) arrived.value++
  }

  function follow(ended: Ended) {
    pause.value = ended.is === 'paused' ? ended.pause : null
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
    const { box } = await machine()
    const isOut = await box.takeOut(ids)
    await changed()
    return isOut
  }

  /** Gives an entry up; the reason stays with it on this device. */
  async function drop(id: string, reason: string): Promise<void> {
    const { box } = await machine()
    await box.drop(id, reason, Date.now())
    await changed()
    await loadDropped()
  }

  /** Takes a refused entry away that its author has recorded anew. */
  async function replaced(id: string): Promise<void> {
    const { box } = await machine()
    await box.giveBack([id])
    await changed()
  }

  async function loadDropped(): Promise<void> {
    const { box } = await machine()
    dropped.value = (await box.dropped()).filter(entry => entry.personId === personId.value)
  }

  /** The person's own entries as a file. */
  async function exportFile(): Promise<Blob> {
    const [{ exportedOutbox }] = await Promise.all([machine(), loadDropped()])
    const content = exportedOutbox(personId.value ?? '', entries.value, dropped.value, deviceNow())
    return new Blob([JSON.stringify(content, null, 2)], { type: 'application/json' })
  }

  /** What of this person's events was recorded last from this device. */
  async function recordedLately(): Promise<RecordedEntry[]> {
    const recorded = await machine().then(({ box }) => box.recorded()).catch(() => [])
    return recorded.filter(entry => entry.personId === personId.value)
  }

  /** The events on a cylinder that wait, in order. */
  function pendingOf(cylinderId: string): CustodyEvent[] {
    return waiting.value.filter(({ event }) => event.cylinderId === cylinderId).map(({ event }) => event)
  }

  return {
    entries, waiting, refused, dropped, oldestAt, sealed, pause, busy, arrived,
    start, attend, read, put, number, sendNow, flush, takeOut, drop, replaced, loadDropped, exportFile, recordedLately, pendingOf,
  }
})

type Machinery = Awaited<ReturnType<typeof load>>

async function load() {
  const [{ outboxBox }, { sendOutbox }, { exportedOutbox }] = await Promise.all([
    import('~~/composables/outboxBox'), import('~~/composables/outboxSender'), import('~~/utils/outbox/exported'),
  ])
  return { box: outboxBox(), sendOutbox, exportedOutbox }
}

function verdictsOf({ settlement, answer }: Told): Map<string, Verdict> {
  const cylinders = 'body' in answer ? (answer.body as EventsAnswer).cylinders ?? [] : []
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

function note(waits: boolean) {
  try {
    if (waits) localStorage.setItem(OUTBOX_WAITS_KEY, '1')
    else localStorage.removeItem(OUTBOX_WAITS_KEY)
  }
  catch {
    // Then it is looked for at every visit.
  }
}

/** Whether something may be waiting; where nothing can be noted, it may. */
function noted(): boolean {
  try {
    return localStorage.getItem(OUTBOX_WAITS_KEY) !== null
  }
  catch {
    return true
  }
}
