import { defineStore } from 'pinia'
import type { OutboxWork } from '~~/composables/outboxWork'
import { mayWait } from '~~/composables/outboxWaits'
import { useSessionStore } from '~~/stores/session'
import type { CustodyEvent } from '~~/utils/custody/event'
import { inOrder, isWaiting, type DroppedEntry, type OutboxEntry } from '~~/utils/outbox/entry'
import type { Pause } from '~~/utils/outbox/settlement'

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
  const isRead = ref(false)
  const personId = computed(() => session.user?.id ?? null)
  const entries = computed(() => inOrder(all.value.filter(entry => entry.personId === personId.value)))
  const waiting = computed(() => entries.value.filter(isWaiting))
  const refused = computed(() => entries.value.filter(entry => !isWaiting(entry)))
  const oldestAt = computed(() => entries.value.length === 0 ? null : Math.min(...entries.value.map(({ queuedAt }) => queuedAt)))
  const sealed = computed(() => all.value.length - entries.value.length)
  let channel: BroadcastChannel | null = null
  let loading: Promise<OutboxWork> | null = null

  async function work(): Promise<OutboxWork> {
    loading ??= import('~~/composables/outboxWork').then(({ outboxWork }) => outboxWork(
      { personId, all, entries, waiting, dropped, pause, busy, arrived, isRead },
      recorded => channel?.postMessage({ recorded }),
    ))
    try {
      return await loading
    }
    catch (error) {
      loading = null
      throw error
    }
  }

  /** An act as what is fetched for it does it. */
  function by<Given extends unknown[], Got>(act: (acts: OutboxWork) => (...given: Given) => Promise<Got>) {
    return async (...given: Given): Promise<Got> => act(await work())(...given)
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
    if (mayWait()) void attend()
    else setTimeout(() => void attend(), LOOK_AFTER_MS)
  }

  async function hear(recorded: boolean) {
    await work().then(acts => acts.reread(), () => {})
    if (recorded) arrived.value++
  }

  /** Reads what waits, and sends what may go. */
  async function attend(): Promise<void> {
    await work().then(acts => acts.attend(), () => {})
  }

  /** Reads what waits, where it was not read yet. */
  async function read(): Promise<void> {
    if (!isRead.value) await work().then(acts => acts.reread(), () => {})
  }

  /** The events on a cylinder that wait, in order. */
  function pendingOf(cylinderId: string): CustodyEvent[] {
    return waiting.value.filter(({ event }) => event.cylinderId === cylinderId).map(({ event }) => event)
  }

  return {
    entries, waiting, refused, dropped, oldestAt, sealed, pause, busy, arrived, start, attend, read, pendingOf,
    put: by(acts => acts.put),
    number: by(acts => acts.number),
    sendNow: by(acts => acts.sendNow),
    flush: by(acts => acts.flush),
    takeOut: by(acts => acts.takeOut),
    drop: by(acts => acts.drop),
    giveBack: by(acts => acts.giveBack),
    loadDropped: by(acts => acts.loadDropped),
    recordedLately: by(acts => acts.recordedLately),
    exportFile: by(acts => acts.exportFile),
  }
})
