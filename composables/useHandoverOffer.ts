import { useApi } from '~~/composables/useApi'
import { useKept } from '~~/composables/useKept'
import { useLoaded } from '~~/composables/useLoaded'
import { usePostingStore } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import type { FleetAnswer } from '~~/utils/contract/custody'
import { codeOrSerial } from '~~/utils/label/codeOrSerial'
import { handoverText, OFFER_ID_LENGTH, offerId, type HandoverOffer } from '~~/utils/handover/handoverText'

const MOST_HELD = 200
const LOOK_AGAIN_MS = 10_000

interface Offered { offer: HandoverOffer, names: Record<string, string> }

/** What this person holds, and what of it is offered to another phone; the offer is kept until it is put away. */
export function useHandoverOffer() {
  const api = useApi()
  const session = useSessionStore()
  const posting = usePostingStore()
  const { restored, keep } = useKept<Offered>('handover')
  const chosen = ref<string[]>([])
  const shown = shallowRef<Offered | null>(null)

  const held = useLoaded('handover-held', async () =>
    (await api.get<FleetAnswer>('/api/cylinders', { holder: session.user!.id, limit: MOST_HELD })).items, [() => posting.recorded])

  const text = computed(() => shown.value && handoverText(shown.value.offer))
  /** Each cylinder offered, and whether this phone's copy still has it with this person. */
  const offered = computed(() => (shown.value?.offer.cylinders ?? []).map(reference => ({
    reference,
    name: shown.value!.names[reference] ?? reference,
    isGone: held.data.value != null && !held.data.value.some(row => row.labelCode === reference || row.id === reference),
  })))

  function show() {
    const rows = (held.data.value ?? []).filter(({ id }) => chosen.value.includes(id))
    const referenceOf = (row: (typeof rows)[number]) => row.labelCode ?? row.id
    const offer: HandoverOffer = {
      is: 'offer',
      id: offerId(crypto.getRandomValues(new Uint8Array(OFFER_ID_LENGTH))),
      personId: session.user!.id,
      atMs: Date.now(),
      cylinders: rows.map(referenceOf),
    }
    shown.value = { offer, names: Object.fromEntries(rows.map(row => [referenceOf(row), codeOrSerial(row)])) }
    keep(shown.value)
  }

  function putAway() {
    shown.value = null
    chosen.value = []
    keep(null)
  }

  let looking: ReturnType<typeof setInterval> | undefined
  onMounted(() => {
    shown.value = restored.value
    looking = setInterval(() => {
      if (shown.value && document.visibilityState === 'visible') void held.refresh()
    }, LOOK_AGAIN_MS)
  })
  onBeforeUnmount(() => clearInterval(looking))

  return { held, chosen, shown, text, offered, show, putAway }
}
