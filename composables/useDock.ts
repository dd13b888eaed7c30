import { useOnline } from '@vueuse/core'
import { v7 as uuidv7 } from 'uuid'
import { answerWithin } from '~~/composables/answerWithin'
import { deviceNow } from '~~/composables/deviceNow'
import { dockBox, type KeptDockEntry, type KeptDockPhoto } from '~~/composables/dockBox'
import { opensNothing, sendDock, type DockSent } from '~~/composables/dockSending'
import { problemOf } from '~~/composables/useApi'
import { useRefreshOnFocus } from '~~/composables/useRefreshOnFocus'
import type { DockAnswer, DockEntriesAnswer } from '~~/utils/contract/dock'
import { dockLines } from '~~/utils/dock/dockLines'
import type { DockEntry, DockKind, DockSaid, LinkedDockEntry } from '~~/utils/dock/entry'
import { readToken } from '~~/utils/dock/linkToken'
import { waitAfter } from '~~/utils/outbox/backOff'

/** What takes longer to be answered is asked again later; a photo is given more. Units: milliseconds. Our choice. */
const [ANSWER_WITHIN_MS, PHOTO_WITHIN_MS] = [20_000, 120_000]
/** Another phone at the same dock has its entries shown here after as long. Units: milliseconds. Our choice. */
const LOOK_AGAIN_MS = 60_000

/** Whether the link shows its shipment, shows nothing, or could not be asked yet. */
export type DockPhase = 'loading' | 'open' | 'nothing' | 'unreached'

/**
 * One shipment over its dock link: what is said of it is kept on this phone first and sent when the server is reached.
 *
 * Shape: `say` answers an entry's id once it is kept here. Errors of `say`: where the phone keeps nothing, an error in words.
 */
export function useDock(token: string) {
  const online = useOnline()
  const path = `/api/dock/${encodeURIComponent(token)}`
  const linkId = readToken(token)?.linkId ?? ''

  const phase = ref<DockPhase>('loading')
  const dock = shallowRef<DockAnswer | null>(null)
  const kept = shallowRef<KeptDockEntry[]>([])
  const photos = shallowRef<KeptDockPhoto[]>([])
  const unreached = ref(false)

  const waiting = computed(() => kept.value.filter(({ problem }) => problem === null))
  const refused = computed(() => kept.value.filter(({ problem }) => problem !== null))
  const entries = computed<LinkedDockEntry[]>(() => {
    const recorded = dock.value?.entries ?? []
    const known = new Set(recorded.map(({ id }) => id))
    return [...recorded, ...waiting.value.filter(({ id }) => !known.has(id)).map(({ entry }) => ({ ...entry, linkId }))]
  })
  const lines = computed(() => dockLines(entries.value))
  const photosToGo = computed(() => photos.value.filter(({ problem }) => problem === null))
  const isOwn = (entry: LinkedDockEntry) => entry.linkId === linkId

  const box = dockBox()
  let sending: Promise<void> | null = null
  let isAskedAgain = false
  let isLeft = false
  let timer: ReturnType<typeof setTimeout> | undefined
  let looking: ReturnType<typeof setInterval> | undefined
  let failures = 0
  let shipmentId: string | null = null
  let answers = 0

  async function load(): Promise<void> {
    const copy = await box.copy(linkId).catch(() => undefined)
    if (copy) shipmentId = copy.shipmentId
    if (copy?.answer && dock.value === null) await show(copy.answer)
    await refresh()
    void send()
  }

  async function refresh(): Promise<void> {
    const before = answers
    try {
      const answer = await ask<DockAnswer>(path)
      // What was sent meanwhile is in the answer to it, and not in this one.
      if (answers === before) await took(answer)
      unreached.value = false
    }
    catch (error) {
      if (opensNothing(problemOf(error))) return end()
      unreached.value = true
      if (dock.value === null) phase.value = 'unreached'
    }
  }

  /** Not before what waits on this phone is there too: without it the shipment would look untouched. */
  async function show(answer: DockAnswer): Promise<void> {
    ;[dock.value, shipmentId] = [answer, answer.shipment.id]
    await reread()
    phase.value = 'open'
  }

  async function took(answer: DockAnswer): Promise<void> {
    // A network that wants its guests to sign in answers with a page of its own.
    if (!Array.isArray(Object(answer).cylinders)) throw new Error('No answer of ours')
    answers++
    await box.keepCopy({ linkId, shipmentId: answer.shipment.id, answer }).catch(() => {})
    await show(answer)
  }

  /** The link opens nothing any more: the shipment goes from this phone, what was not sent stays. */
  async function end(): Promise<void> {
    await reread()
    ;[phase.value, dock.value] = ['nothing', null]
    if (shipmentId !== null) await box.keepCopy({ linkId, shipmentId, answer: null }).catch(() => {})
  }

  async function reread(): Promise<void> {
    if (shipmentId === null) return
    ;[kept.value, photos.value] = await Promise.all([box.entries(shipmentId), box.photos(shipmentId)]).catch((): [KeptDockEntry[], KeptDockPhoto[]] => [kept.value, photos.value])
  }

  /** Keeps an entry, with photos that it names, and sends it. */
  async function say<Kind extends DockKind>(kind: Kind, said: DockSaid[Kind], by: { name: string, photos: KeptDockPhoto['bytes'][] }): Promise<string> {
    if (shipmentId === null) throw new Error('No shipment is open.')
    const of = shipmentId
    const [id, at] = [uuidv7(), deviceNow()]
    const taken = ('photoIds' in said ? by.photos : []).map(bytes => ({ id: uuidv7(), shipmentId: of, entryId: id, takenAt: at, bytes, problem: null }))
    // As plain data: a store takes nothing that a screen still watches.
    const plain = JSON.parse(JSON.stringify(said)) as DockSaid[Kind]
    const entry = { id, kind, name: by.name, at, said: 'photoIds' in plain ? { ...plain, photoIds: taken.map(photo => photo.id) } : plain } as DockEntry
    try {
      await box.put({ id, shipmentId: of, entry, problem: null }, taken)
    }
    catch {
      throw new Error('This phone could not keep it: its storage did not answer. Nothing was said; try again.')
    }
    await reread()
    void send()
    return id
  }

  async function drop(id: string): Promise<void> {
    await box.drop(id)
    await reread()
  }

  /** Sends what waits, one sending at a time; what is not reached is tried again by itself. */
  function send(): Promise<void> {
    isAskedAgain = sending !== null
    sending ??= sendNow().finally(() => {
      sending = null
      if (isAskedAgain && !isLeft) void send()
    })
    return sending
  }

  async function sendNow(): Promise<void> {
    clearTimeout(timer)
    if (shipmentId === null || phase.value === 'nothing') return
    // Where the phone's storage fails there is nothing that could be sent.
    const ended = await sendDock(box, shipmentId, { post, postPhoto, answered: took }).catch((): DockSent => 'done')
    await reread()
    unreached.value = ended === 'unreached'
    if (ended === 'ended') return end()
    failures = ended === 'done' ? 0 : failures + 1
    if (ended === 'unreached' && !isLeft) timer = setTimeout(() => void send(), waitAfter(failures))
  }

  function ask<T>(url: string, sent?: object, within = ANSWER_WITHIN_MS): Promise<T> {
    return answerWithin(within, signal => $fetch<unknown>(url, { retry: false, signal, ...(sent && { method: 'POST', body: sent as Record<string, unknown> }) })) as Promise<T>
  }

  const post = (going: DockEntry[]) =>
    ask<DockEntriesAnswer>(`${path}/shipments/${shipmentId}/entries`, { deviceNow: deviceNow(), entries: going })

  function postPhoto({ id, takenAt, bytes }: KeptDockPhoto): Promise<unknown> {
    const form = new FormData()
    for (const [name, value] of Object.entries({ id, takenAt, subject: 'damage' })) form.append(name, value)
    form.append('file', new Blob([bytes]), 'photo')
    return ask(`${path}/photos`, form, PHOTO_WITHIN_MS)
  }

  function lookAgain() {
    if (phase.value === 'open' && online.value && document.visibilityState === 'visible') void refresh()
  }

  onMounted(() => {
    void load()
    looking = setInterval(lookAgain, LOOK_AGAIN_MS)
  })
  watch(online, isOnline => isOnline && void load())
  useRefreshOnFocus(() => void refresh().then(send))
  onBeforeUnmount(() => {
    clearTimeout(timer)
    clearInterval(looking)
    isLeft = true
    void Promise.resolve(sending).finally(() => box.close())
  })

  return { phase, dock, entries, lines, waiting, refused, photosToGo, unreached, isOwn, say, drop, send, load }
}
