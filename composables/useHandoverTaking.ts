import { problemOf, useApi } from '~~/composables/useApi'
import { deviceNow, usePostingStore, type Settled } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import type { CylinderView } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'
import { handoverText, type HandoverOffer } from '~~/utils/handover/handoverText'
import { takenLine, type OfferedCylinder } from '~~/utils/handover/takenLine'

/** Takes what another phone offers: looks each cylinder up, records that it went into this person's hands, and answers. */
export function useHandoverTaking(offer: HandoverOffer, supervisorId: () => string) {
  const api = useApi()
  const session = useSessionStore()
  const posting = usePostingStore()
  const found = shallowRef<OfferedCylinder[] | null>(null)
  const settled = shallowRef<Settled[]>([])
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)
  // Sent again they are the same events.
  let events: CustodyEvent[] = []

  const lines = computed(() => (found.value ?? []).map((each) => {
    const end = settled.value.find(({ event }) => event.cylinderId === each.view?.id)
    const outcome = end ? { isTaken: end.posted !== null, text: end.posted ? (end.posted.isQueued ? 'You have it now, saved on this phone' : 'You have it now') : `Refused: ${end.problem?.detail || end.problem?.title}` } : null
    return { ...each, ...takenLine(each, offer.personId, session.user?.id ?? ''), outcome }
  }))
  const takes = computed(() => lines.value.filter(({ canTake }) => canTake))
  const isDone = computed(() => settled.value.length > 0)
  const answer = computed(() => isDone.value
    ? handoverText({ ...offer, is: 'answer', personId: session.user!.id, cylinders: lines.value.filter(({ outcome }) => outcome?.isTaken).map(({ reference }) => reference) })
    : null)

  async function lookUp() {
    found.value = await Promise.all(offer.cylinders.map(async (reference) => {
      try {
        return { reference, view: await api.get<CylinderView>(`/api/cylinders/${reference}`), problem: null }
      }
      catch (error) {
        const { status, detail, title } = problemOf(error)
        return { reference, view: null, problem: status === 404 ? null : detail || title }
      }
    }))
  }

  async function take() {
    if (session.user?.trainee && !supervisorId()) {
      problem.value = { type: 'about:blank', title: 'Choose who supervises.', status: 400, detail: 'They countersign it; until then it waits for their name.' }
      return
    }
    busy.value = true
    problem.value = null
    if (events.length === 0) {
      events = takes.value.map(({ view }) => posting.seal<'handed-over'>({
        cylinderId: view!.id, kind: 'handed-over', occurredAt: deviceNow(),
        ...(supervisorId() && { supervisorId: supervisorId() }),
        details: { toHolderId: session.user!.id },
      }) as CustodyEvent)
    }
    try {
      settled.value = await posting.postAll(events)
    }
    catch (error) {
      problem.value = problemOf(error)
    }
    finally {
      busy.value = false
    }
  }

  onMounted(lookUp)
  return { found, lines, takes, isDone, answer, busy, problem, take }
}
