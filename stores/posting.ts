import { defineStore } from 'pinia'
import { v7 as uuidv7 } from 'uuid'
import { ApiError, problemOf, useApi } from '~~/composables/useApi'
import { useDevice } from '~~/composables/useDevice'
import type { CylinderView, EventsAnswer } from '~~/utils/contract/custody'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { EventKind } from '~~/utils/custody/kinds'
import { KIND_WORDS } from '~~/utils/custody/words'
import { isoWithOffset } from '~~/utils/quantity/instant'

/** An event as a form has it, before it is given its id and its place in the device's count. */
export type NewEvent<K extends EventKind = EventKind> = Omit<CustodyEvent<K>, 'id' | 'deviceId' | 'deviceSeq'>

/** What was recorded, and the cylinder as it now stands. */
export interface Posted { event: CustodyEvent, version: number, cylinder: CylinderView | null }

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
  const last = shallowRef<Posted | null>(null)
  /** The event that was last taken back. */
  const takenBackId = ref<string | null>(null)
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
    busy.value = true
    try {
      const answer = await api.post<EventsAnswer>('/api/events', { events: [event], deviceNow: deviceNow() })
      const result = answer.results.find(each => each.id === event.id)
      if (result?.outcome === 'refused' && result.problem) throw new ApiError(result.problem)
      if (result?.version === undefined) throw new ApiError(problemOf(undefined))
      recorded.value++
      const cylinder = answer.cylinders.find(each => each.id === event.cylinderId) ?? null
      return { event, version: result.version, cylinder }
    }
    finally {
      busy.value = false
    }
  }

  /** Says on every screen what was recorded, and offers for ten seconds to take it back. */
  function announce(posted: Posted) {
    say(`Recorded: ${KIND_WORDS[posted.event.kind].done.toLowerCase()}`)
    if (NOT_TAKEN_BACK.includes(posted.event.kind)) return
    last.value = posted
  }

  /** Takes back what was just recorded, by an event of its own: the log loses nothing. */
  async function takeBack(): Promise<CylinderView | null> {
    const taken = last.value
    if (!taken) return null
    clear()
    try {
      const correction = seal<'corrected'>({
        cylinderId: taken.event.cylinderId,
        kind: 'corrected',
        occurredAt: deviceNow(),
        expects: taken.version,
        details: { eventId: taken.event.id, reason: 'taken back at once' },
      })
      const posted = await post(correction as CustodyEvent)
      takenBackId.value = taken.event.id
      say('Taken back. Both lines stay in the custody log.')
      return posted.cylinder
    }
    catch (error) {
      const problem = problemOf(error)
      say(problem.status === 409
        ? 'Something was recorded after it. Correct it from its line in the custody log.'
        : `Not taken back: ${problem.detail || problem.title}`)
      return null
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

  return { notice, last, takenBackId, busy, recorded, seal, post, announce, takeBack, say, clear }
})
