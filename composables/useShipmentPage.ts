import { useApi } from '~~/composables/useApi'
import { useLoaded } from '~~/composables/useLoaded'
import { useNotice } from '~~/composables/useNotice'
import { useRefreshOnFocus } from '~~/composables/useRefreshOnFocus'
import { useShipment } from '~~/composables/useShipment'
import { useShipmentPapers } from '~~/composables/useShipmentPapers'
import { useSessionStore } from '~~/stores/session'
import type { FirmsAnswer, PlacesAnswer } from '~~/utils/contract/places'
import type { Classification } from '~~/utils/transport/shipperEntries'
import { shipmentName } from '~~/utils/shipment/shipmentName'
import { whatNext } from '~~/utils/shipment/whatNext'

/** What the page of a shipment shows and does: its next step, its lines and who carries it, what came back, its papers. */
export function useShipmentPage(id: string) {
  const api = useApi()
  const session = useSessionStore()
  const notice = useNotice()
  const list = useShipment(id)
  const papers = useShipmentPapers(id)

  const shown = computed(() => list.data.value ?? null)
  const name = computed(() => shown.value ? shipmentName(shown.value) : 'Shipment')
  const isOpen = computed(() => shown.value?.state === 'draft' || shown.value?.state === 'ready')
  const isAway = computed(() => shown.value?.state === 'dispatched' || shown.value?.state === 'arrived')
  const mayChange = computed(() => isOpen.value && session.mayI('shipments:prepare'))
  const mayTakeBack = computed(() => isAway.value && session.mayI('shipments:prepare'))
  const next = computed(() => shown.value && whatNext(shown.value, permission => session.mayI(permission)))
  const heldBack = computed(() => (shown.value?.lines ?? []).filter(line => line.because.length > 0))

  const firms = useLoaded('shipment-firms', () => api.get<FirmsAnswer>('/api/firms', { active: 'true' }))
  const carriers = computed(() => firms.data.value?.items.filter(({ kind }) => kind === 'carrier') ?? [])
  /** Where its papers may be mailed: the reclaimer's address, null where it has none; undefined where nobody here may, or it is not known yet. */
  const mailTo = computed(() => !session.mayI('shipments:dispatch') || !firms.data.value
    ? undefined
    : firms.data.value.items.find(firm => firm.id === shown.value?.to.id)?.email ?? null)
  const places = useLoaded('places-in-use', async () => mayTakeBack.value ? api.get<PlacesAnswer>('/api/places', { active: 'true' }) : null, [mayTakeBack])
  const ourPlaces = computed(() => (places.data.value?.items ?? []).filter(place => place.kind !== 'firm'))

  const takingOff = ref<string[]>([])
  const isTakingOff = computed({
    get: () => takingOff.value.length > 0,
    set: (open) => {
      if (!open) takingOff.value = []
    },
  })
  const isGivingUp = ref(false)
  const isReturning = ref(false)

  useRefreshOnFocus(list.refresh)
  // The papers follow the shipment until it leaves.
  watch(() => JSON.stringify([shown.value?.state, shown.value?.carrier, shown.value?.lines.map(({ cylinder, version, weighed }) => [cylinder.id, version, weighed?.gross])]), (now, before) => {
    if (before !== undefined && now !== before) void papers.refresh()
  })

  // A scan goes onto the list; once it has left, a scan opens the cylinder.
  function scan(code: string) {
    return mayChange.value ? list.add(code) : navigateTo(`/c/${code.toLowerCase()}`)
  }

  async function takeOff(reason: string) {
    const ids = takingOff.value
    takingOff.value = []
    if (await list.takeOff(ids, reason)) notice.say(ids.length === 1 ? 'Taken off.' : `${ids.length} taken off.`, () => list.putOn(ids))
  }

  async function giveUp(reason: string) {
    isGivingUp.value = false
    await list.act('cancel', { reason })
  }

  async function takeBack(...back: Parameters<typeof list.takeBack>) {
    if (!await list.takeBack(...back)) return
    isReturning.value = false
    notice.say(back[2].length === 1 ? '1 cylinder is back.' : `${back[2].length} cylinders are back.`)
  }

  async function classify(cylinderId: string, classification: Classification | null) {
    if (await papers.classify(cylinderId, classification)) await Promise.all([list.refresh(), list.acts.refresh()])
  }

  async function mail(letter: Parameters<typeof papers.mail>[0]) {
    const sent = await papers.mail(letter)
    if (sent) notice.say(sent.mail === 'sent' ? `The papers went to ${sent.recipient}.` : `The letter to ${sent.recipient} is kept here: it could not be sent.`)
    void list.acts.refresh()
  }

  return {
    list, papers, notice, name, isOpen, mayChange, mayTakeBack, next, heldBack, carriers, mailTo, ourPlaces,
    takingOff, isTakingOff, isGivingUp, isReturning, scan, takeOff, giveUp, takeBack, classify, mail,
  }
}
