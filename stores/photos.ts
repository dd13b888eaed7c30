import { defineStore } from 'pinia'
import { v7 as uuidv7 } from 'uuid'
import { answerWithin } from '~~/composables/answerWithin'
import { deviceNow } from '~~/composables/deviceNow'
import { problemOf } from '~~/composables/useApi'
import type { HeldPhoto } from '~~/composables/photoBox'
import { useOutboxStore } from '~~/stores/outbox'
import { useSessionStore } from '~~/stores/session'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { PhotoSubject } from '~~/utils/photo/subject'
import { PHOTOS_WAIT_KEY } from '~~/utils/photo/waitKey'

/** How long it is waited before photos are tried again, longer each time. */
const TRY_AGAIN_MS = [5_000, 15_000, 60_000]
/** A photo that takes longer to arrive is tried again later. Units: milliseconds. Our choice. */
const ANSWER_WITHIN_MS = 120_000
/** Answers that another try would only repeat. */
const FINAL = new Set([400, 403, 404, 409, 413, 415, 422])

/** The photos of this device on their way to the server. Events do not wait for them. */
export const usePhotosStore = defineStore('photos', () => {
  const session = useSessionStore()
  const outbox = useOutboxStore()
  const all = shallowRef<HeldPhoto[]>([])
  // Whoever signs in next on this device neither sees nor sends them.
  const held = computed(() => all.value.filter(({ personId }) => personId === session.user?.id))
  const busy = ref(false)
  /** The server was not reached, or not ready, at the last try. */
  const unreached = ref(false)
  /** Nothing can be kept on this device: photos last as long as the page. */
  const unkept = ref(false)
  /** Goes up with each photo that has arrived. */
  const arrived = ref(0)
  /** Those of events that are not recorded yet: the server takes no photo of what it does not know. */
  const awaited = computed(() => new Set(outbox.entries.flatMap(({ event }) => event.photoIds ?? [])))
  const waiting = computed(() => held.value.filter(({ id, form, refusal }) => form === null && refusal === null && !awaited.value.has(id)))
  const refused = computed(() => held.value.filter(({ refusal }) => refusal !== null))
  let loaded: { personId: string, done: Promise<void> } | null = null
  let timer: ReturnType<typeof setTimeout> | undefined
  let tries = 0

  /** Finds what is kept on this device for whoever is signed in, and sends what may go. */
  async function load(): Promise<void> {
    const personId = session.user?.id
    if (personId === undefined) return
    if (loaded === null) window.addEventListener('online', () => void send())
    if (loaded?.personId !== personId) loaded = { personId, done: find(personId) }
    await loaded.done
  }

  /** Those of events that were recorded from here of late. */
  async function namedLately(): Promise<ReadonlySet<string>> {
    await outbox.read()
    return new Set((await outbox.recordedLately().catch(() => [])).flatMap(({ event }) => event.photoIds ?? []))
  }

  async function find(personId: string) {
    const lately = await namedLately()
    const named = new Set([...lately, ...awaited.value])
    const found = await inBox(box => box.of(personId, Date.now(), named)) ?? []
    all.value = [...found, ...all.value.filter(({ id }) => !found.some(each => each.id === id))]
    note()
    void send()
  }

  /** What the box answers; null where this device keeps nothing. */
  async function inBox<T>(work: (box: Awaited<ReturnType<typeof openBox>>) => Promise<T>): Promise<T | null> {
    try {
      const box = await openBox()
      return await work(box).finally(() => box.close())
    }
    catch {
      unkept.value = true
      return null
    }
  }

  /** Keeps a photo for a form that is not recorded yet. */
  async function take(form: string, bytes: HeldPhoto['bytes'], subject: PhotoSubject): Promise<void> {
    await keep({ id: uuidv7(), personId: session.user?.id ?? '', form, eventId: null, subject, takenAt: deviceNow(), bytes, refusal: null })
  }

  async function keep(photo: HeldPhoto): Promise<void> {
    all.value = all.value.some(({ id }) => id === photo.id) ? all.value.map(each => each.id === photo.id ? photo : each) : [...all.value, photo]
    note()
    await inBox(box => box.put(photo))
  }

  async function remove(id: string): Promise<void> {
    all.value = all.value.filter(photo => photo.id !== id)
    note()
    await inBox(box => box.remove(id))
  }

  const ofForm = (form: string) => held.value.filter(photo => photo.form === form)

  /** The form was recorded: its photos may go, put to an event where that does not name them. */
  async function release(form: string, eventId: string | null = null): Promise<void> {
    for (const photo of ofForm(form)) await keep({ ...photo, form: null, eventId })
    void send()
  }

  /** Where the page was closed after its event was saved and before its photos were let go, these go once it is recorded. */
  async function releaseNamed(): Promise<void> {
    if (held.value.every(({ form }) => form === null)) return
    const named = await namedLately()
    for (const photo of held.value) if (photo.form !== null && named.has(photo.id)) await keep({ ...photo, form: null })
  }

  /** The form was given up, and its photos with it. */
  async function drop(form: string): Promise<void> {
    for (const { id } of ofForm(form)) await remove(id)
  }

  /** Sends what waits, one after another; what is not reached is tried again by itself. */
  async function send(): Promise<void> {
    if (busy.value) return
    busy.value = true
    clearTimeout(timer)
    try {
      await outbox.read()
      await releaseNamed()
      for (let next = waiting.value[0]; next; next = waiting.value[0]) {
        const problem = await post(next)
        if (problem === null) {
          await remove(next.id)
          arrived.value++
        }
        else if (FINAL.has(problem.status)) {
          await keep({ ...next, refusal: problem.detail || problem.title })
        }
        else {
          later()
          return
        }
      }
      unreached.value = false
      tries = 0
    }
    finally {
      busy.value = false
    }
  }

  watch(() => outbox.arrived, () => void send())

  function later() {
    unreached.value = true
    timer = setTimeout(() => void send(), TRY_AGAIN_MS[Math.min(tries, TRY_AGAIN_MS.length - 1)])
    tries++
  }

  /** Tries again what was refused, with the rest. */
  async function retry(): Promise<void> {
    for (const photo of refused.value) await keep({ ...photo, refusal: null })
    await send()
  }

  // Without this a visit that has nothing to send would open the box.
  function note() {
    try {
      if (all.value.length > 0) localStorage.setItem(PHOTOS_WAIT_KEY, '1')
      else localStorage.removeItem(PHOTOS_WAIT_KEY)
    }
    catch {
      unkept.value = true
    }
  }

  return { held, busy, unreached, unkept, arrived, waiting, refused, load, take, keep, remove, ofForm, release, drop, send, retry }
})

async function openBox() {
  const { openPhotoBox } = await import('~~/composables/photoBox')
  return openPhotoBox()
}

/** Sends one photo; null where it has arrived. A session that ended leads nowhere: the photo waits for the next one. */
async function post({ id, subject, takenAt, eventId, bytes }: HeldPhoto): Promise<ProblemDetails | null> {
  const form = new FormData()
  for (const [name, value] of Object.entries({ id, subject, takenAt, ...(eventId && { eventId }) })) form.append(name, value)
  form.append('file', new Blob([bytes]), 'photo')
  try {
    await answerWithin(ANSWER_WITHIN_MS, signal => $fetch<unknown>('/api/uploads', { method: 'POST', body: form, retry: false, signal }))
    return null
  }
  catch (error) {
    return problemOf(error)
  }
}
