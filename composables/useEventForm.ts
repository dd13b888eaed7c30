import { problemOf } from '~~/composables/useApi'
import { deviceNow, usePostingStore, type NewEvent, type Posted } from '~~/stores/posting'
import { useKept } from '~~/composables/useKept'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'

/** What every form asks beside the details of its kind. */
export interface Envelope {
  /** '' = now, else the local time as the browser's field has it. */
  at: string
  supervisorId: string
  note: string
}

interface Kept<Draft> {
  draft: Draft
  envelope: Envelope
  /** What was sent and may have arrived: the same content goes out again as the same event. */
  sent: { content: string, event: CustodyEvent } | null
}

/**
 * The content of a form, kept until it is recorded: a lost network, a refusal or a closed page loses nothing.
 *
 * Shape: `key` names the form, by cylinder and kind; `supervisorId` is whom a trainee's form begins with, '' for nobody.
 */
export function useEventForm<Draft extends object>(key: string, empty: () => Draft, supervisorId: () => string = () => '') {
  const posting = usePostingStore()
  const { restored: kept, keep: store } = useKept<Kept<Draft>>(key)
  const draft = ref(empty()) as Ref<Draft>
  const envelope = ref(emptyEnvelope())
  const sent = shallowRef<Kept<Draft>['sent']>(null)
  const restored = ref(false)
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)
  const posted = shallowRef<Posted | null>(null)

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

  /** Records what the form says; whatever goes wrong, the form stays as it is and says so. */
  async function send(content: Omit<NewEvent, 'occurredAt'>): Promise<Posted | null> {
    busy.value = true
    problem.value = null
    const event = sealedOnce(content)
    try {
      posted.value = await posting.post(event)
      posting.announce(posted.value)
      store(null)
      return posted.value
    }
    catch (error) {
      problem.value = problemOf(error)
      return null
    }
    finally {
      busy.value = false
    }
  }

  function sealedOnce(content: Omit<NewEvent, 'occurredAt'>): CustodyEvent {
    const text = JSON.stringify([content, envelope.value.at])
    if (sent.value?.content === text) return sent.value.event
    const { at } = envelope.value
    const occurredAt = at === '' ? deviceNow() : deviceNow(new Date(at).getTime())
    const before = sent.value?.event
    const event = before
      ? { ...content, occurredAt, id: before.id, deviceId: before.deviceId, deviceSeq: before.deviceSeq }
      : posting.seal({ ...content, occurredAt })
    sent.value = { content: text, event: event as CustodyEvent }
    keep()
    return event as CustodyEvent
  }

  return { draft, envelope, restored, busy, problem, posted, send, startOver }
}
