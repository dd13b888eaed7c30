import { defineStore } from 'pinia'
import { answerWithin } from '~~/composables/answerWithin'
import { keptPerson } from '~~/composables/keptPerson'
import { kitBox, type KitAbout } from '~~/composables/kitBox'
import { useSessionStore } from '~~/stores/session'
import type { KitAnswer, KitFirm } from '~~/utils/contract/kit'
import type { Names } from '~~/utils/custody/view'
import { kitNames } from '~~/utils/kit/kitContext'
import { kitEntry } from '~~/utils/kit/kitEntry'
import { KIT_FORM } from '~~/utils/kit/packCylinder'

const FOLLOW_EVERY_MS = 3 * 60_000
/** Where the network takes an answer and brings none, it is asked again later. */
const PATIENCE_MS = 60_000
const LOCK = 'collarbook-kit'

/** The copy of the firm on this device: the whole fleet and what is needed to judge it, following the server. */
export const useKitStore = defineStore('kit', () => {
  const session = useSessionStore()
  const box = kitBox()
  const about = shallowRef<KitAbout | null>(null)
  const count = ref(0)
  /** Nothing can be kept on this device. */
  const unkept = ref(false)
  const seq = computed(() => about.value?.seq ?? 0)
  const followedAt = computed(() => about.value?.followedAt ?? null)
  let firmRead: { tag: string, firm: KitFirm, names: Names } | null = null
  let hasStarted = false
  let following: Promise<void> | null = null

  /** Finds the copy of whoever is signed in, throws away another person's, and follows the server from then on. */
  async function start(): Promise<void> {
    if (session.user === null) return
    await find()
    if (!hasStarted) listen()
    await follow()
  }

  function listen() {
    hasStarted = true
    window.addEventListener('online', () => void follow())
    document.addEventListener('visibilitychange', () => {
      if (document.visibilityState === 'visible') void follow()
    })
    setInterval(() => void follow(), FOLLOW_EVERY_MS)
    watch(() => session.user?.id, id => void (id === undefined ? undefined : find().then(follow)))
  }

  async function find(): Promise<void> {
    const kept = await inBox(() => box.about()) ?? null
    if (isLeftOver()) return tell(null)
    if (kept && (kept.personId !== session.user?.id || kept.form !== KIT_FORM)) return wipe()
    await tell(kept)
  }

  /** Whether somebody else has signed in on this device since, in another tab: the copy is theirs now. */
  function isLeftOver(): boolean {
    const person = keptPerson()
    return person !== null && person.id !== session.user?.id
  }

  async function tell(next: KitAbout | null) {
    about.value = next
    count.value = next === null ? 0 : await inBox(() => box.count()) ?? 0
  }

  /** Fetches what has changed; without the server the copy stays as it is. One tab does it for all. */
  async function follow(): Promise<void> {
    if (session.user === null || isLeftOver() || !navigator.onLine) return
    following ??= alone(fetchAll, find).finally(() => {
      following = null
    })
    await following
  }

  async function fetchAll(): Promise<void> {
    await find()
    for (let goesOn = true; goesOn;) goesOn = await fetchPart()
    // Counting takes its time in a large fleet: not after each part.
    await tell(about.value)
  }

  /** Answers whether there is more to fetch at once. */
  async function fetchPart(): Promise<boolean> {
    const personId = session.user?.id
    const before = await inBox(() => box.about()) ?? null
    if (personId === undefined || (before && before.personId !== personId)) return false
    const answer = await ask(before)
    // A newer server than this page: what is here serves until the page is the newer one too.
    if (answer === null || answer.form !== KIT_FORM || session.user?.id !== personId) return false
    const { anew, firm: told, cylinders, next, more } = answer
    const { tag, ...firm } = told ?? { tag: before?.firmTag ?? '' }
    const now = { personId, form: KIT_FORM, seq: answer.seq, mark: answer.mark, next, firmTag: tag, followedAt: Date.now() }
    const taken = await inBox(() => box.take({ anew, before, about: now, entries: cylinders.map(kitEntry), firm: told ? firm as KitFirm : null }))
    if (taken) about.value = now
    if (taken === false) await find()
    return taken === true && (next !== null || more)
  }

  /** Another person's copy must not be seen, nor what a signed-out device had. */
  async function wipe(): Promise<void> {
    firmRead = null
    about.value = null
    count.value = 0
    await inBox(() => box.clear())
  }

  /** What an answer from the copy is made of; null where there is no copy of this person's. */
  async function reading(): Promise<{ box: typeof box, about: KitAbout, firm: KitFirm, names: Names } | null> {
    // Another tab may have brought it further.
    if (about.value === null || about.value.next !== null) await find()
    const at = about.value
    if (at === null || at.personId !== session.user?.id) return null
    if (firmRead?.tag !== at.firmTag) {
      const firm = await inBox(() => box.firm())
      if (!firm) return null
      firmRead = { tag: at.firmTag, firm, names: kitNames(firm) }
    }
    return { box, about: at, ...firmRead }
  }

  /** How many cylinders stand in each of some places. */
  async function countHaving(placeIds: readonly string[]): Promise<number[]> {
    return await inBox(() => box.countHaving('placeId', placeIds)) ?? []
  }

  /** What the box answers; null where this device keeps nothing. */
  async function inBox<T>(work: () => Promise<T>): Promise<T | null> {
    try {
      const answer = await work()
      unkept.value = false
      return answer
    }
    catch {
      unkept.value = true
      return null
    }
  }

  return { seq, followedAt, count, unkept, start, follow, wipe, reading, countHaving }
})

/** Asks for the next part. Null where the server was not reached or knows nobody: then the copy stays as it is. */
async function ask(before: KitAbout | null): Promise<KitAnswer | null> {
  const query = before === null ? {} : { since: before.seq, mark: before.mark, firm: before.firmTag, ...before.next === null ? {} : { after: before.next } }
  try {
    return await answerWithin(PATIENCE_MS, signal => $fetch<KitAnswer>('/api/kit', { query, retry: false, signal }))
  }
  catch {
    return null
  }
}

/** Does the work where no other tab is at it, else something else. */
async function alone(work: () => Promise<void>, otherwise: () => Promise<void>): Promise<void> {
  // Without a secure connection a browser has none.
  const locks = navigator.locks as LockManager | null | undefined
  if (!locks) return work()
  await locks.request(LOCK, { ifAvailable: true }, lock => lock === null ? otherwise() : work())
}
