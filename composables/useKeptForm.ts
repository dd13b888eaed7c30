import { useKept, type KeptOn } from '~~/composables/useKept'
import { deviceNow, usePostingStore, type NewEvent } from '~~/stores/posting'
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
  /** What was sent and may have arrived: the same content goes out again as the same events. */
  sent: { content: string, events: CustodyEvent[] } | null
}

/**
 * The content of a form, kept until it is recorded: a lost network, a refusal or a closed page loses nothing.
 *
 * Shape: `key` names the form, by cylinder and kind; `supervisorId` is whom a trainee's form begins with, '' for nobody;
 * a form that is kept on the device is the same in all its tabs, and `endedElsewhere` once one of them has ended it;
 * `sealedOnce` makes the events to send, `takesRefusal` is asked once they are refused, `recorded` forgets what was kept.
 */
export function useKeptForm<Draft extends object>(key: string, empty: () => Draft, supervisorId: () => string, keptOn: KeptOn = 'tab') {
  const posting = usePostingStore()
  const { restored: kept, keep: store, followOtherTabs } = useKept<Kept<Draft>>(key, keptOn)
  const draft = ref(empty()) as Ref<Draft>
  const envelope = ref(emptyEnvelope())
  const sent = shallowRef<Kept<Draft>['sent']>(null)
  const restored = ref(false)
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)

  /** Kept on the device, it was recorded or put away in another tab. */
  const endedElsewhere = ref(false)
  let isFollowing = false
  let isHere = true
  let takesPlace = false

  onBeforeUnmount(() => {
    isHere = false
  })
  onMounted(() => {
    if (kept.value) takeUp(kept.value)
    watch([draft, envelope], () => {
      if (!isFollowing) keep()
    }, { deep: true })
  })
  if (keptOn === 'device') {
    followOtherTabs((entry) => {
      endedElsewhere.value = entry === null
      if (!entry) return
      // What another tab keeps is kept: written back it would outlive its end there.
      isFollowing = true
      takeUp(entry)
      void nextTick(() => {
        isFollowing = false
      })
    })
  }

  function takeUp(entry: Kept<Draft>) {
    draft.value = { ...empty(), ...entry.draft }
    envelope.value = entry.envelope
    sent.value = entry.sent
    restored.value = true
  }

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

  function recorded() {
    store(null)
  }

  function sealedOnce(contents: readonly Omit<NewEvent, 'occurredAt'>[]): CustodyEvent[] {
    const { at } = envelope.value
    const content = JSON.stringify([contents, at])
    if (sent.value?.content === content) return sent.value.events
    const occurredAt = at === '' ? deviceNow() : deviceNow(new Date(at).getTime())
    const before = sent.value?.events
    const events = contents.map((each, index) => {
      const same = before?.[index]
      return same
        ? { ...each, occurredAt, id: same.id, deviceId: same.deviceId, deviceSeq: same.deviceSeq } as CustodyEvent
        : posting.seal({ ...each, occurredAt })
    })
    sent.value = { content, events }
    keep()
    return events
  }

  /** What is recorded takes the place of a refused event of this device, as the same one: both never stand. */
  function takePlaceOf(event: CustodyEvent) {
    takesPlace = true
    sent.value ??= { content: '', events: [event] }
  }

  /** Whether a refusal is shown here alone; else it stands where what is not sent does. */
  const takesRefusal = () => isHere && !takesPlace

  return { draft, envelope, restored, endedElsewhere, busy, problem, startOver, recorded, sealedOnce, takePlaceOf, takesRefusal }
}
