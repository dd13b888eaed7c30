import { problemOf } from '~~/composables/useApi'
import { useKept } from '~~/composables/useKept'
import type { Envelope } from '~~/composables/useEventForm'
import { deviceNow, usePostingStore, type NewEvent, type Posted } from '~~/stores/posting'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'

/** One half as its form gives it. */
export type NewHalf = Omit<NewEvent, 'occurredAt'>

interface Kept<Draft> {
  draft: Draft
  envelope: Envelope
  /** What was sent and may have arrived: the same halves go out again under their ids. */
  sent: { content: string, events: CustodyEvent[] } | null
}

/**
 * The form of what happens between two cylinders, kept until both halves are recorded: they go out in one request.
 *
 * Shape: `key` names the form, by cylinder and kind; `supervisorId` is whom a trainee's form begins with, '' for nobody.
 */
export function usePairForm<Draft extends object>(key: string, empty: () => Draft, supervisorId: () => string) {
  const posting = usePostingStore()
  const { restored: kept, keep: store } = useKept<Kept<Draft>>(key)
  const draft = ref(empty()) as Ref<Draft>
  const envelope = ref(emptyEnvelope())
  const sent = shallowRef<Kept<Draft>['sent']>(null)
  const restored = ref(false)
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)
  const posted = shallowRef<Posted[] | null>(null)

  onMounted(() => {
    if (kept.value) {
      draft.value = { ...empty(), ...kept.value.draft }
      envelope.value = kept.value.envelope
      sent.value = kept.value.sent
      restored.value = true
    }
    watch([draft, envelope], keep, { deep: true })
  })

  function emptyEnvelope(): Envelope {
    return { at: '', supervisorId: supervisorId(), note: '' }
  }

  function keep() {
    store({ draft: draft.value, envelope: envelope.value, sent: sent.value })
  }

  function startOver() {
    draft.value = empty()
    envelope.value = emptyEnvelope()
    sent.value = null
    restored.value = false
    problem.value = null
    nextTick(() => store(null))
  }

  /** Records both halves; whatever goes wrong, the form stays as it is and says so. */
  async function send(halves: readonly NewHalf[], announcement: string): Promise<void> {
    busy.value = true
    problem.value = null
    try {
      const settled = await posting.postAll(sealedOnce(halves))
      // The half that is at fault says why; the other was only held back.
      const refusals = settled.flatMap(each => each.problem ? [each.problem] : [])
      if (refusals.length > 0) problem.value = refusals.find(({ status }) => status !== 409) ?? refusals[0]!
      else {
        posted.value = settled.flatMap(each => each.posted ? [each.posted] : [])
        posting.announceAll(posted.value, announcement)
        store(null)
      }
    }
    catch (error) {
      problem.value = problemOf(error)
    }
    finally {
      busy.value = false
    }
  }

  function sealedOnce(halves: readonly NewHalf[]): CustodyEvent[] {
    const { at } = envelope.value
    const content = JSON.stringify([halves, at])
    if (sent.value?.content === content) return sent.value.events
    const occurredAt = at === '' ? deviceNow() : deviceNow(new Date(at).getTime())
    const before = sent.value?.events
    const events = halves.map((half, index) => {
      const same = before?.[index]
      return same
        ? { ...half, occurredAt, id: same.id, deviceId: same.deviceId, deviceSeq: same.deviceSeq } as CustodyEvent
        : posting.seal({ ...half, occurredAt })
    })
    sent.value = { content, events }
    keep()
    return events
  }

  return { draft, envelope, restored, busy, problem, posted, send, startOver }
}
