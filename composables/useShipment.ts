import { v7 as uuidv7 } from 'uuid'
import { useActedList } from '~~/composables/useActedList'
import { useApi } from '~~/composables/useApi'
import { useLoaded } from '~~/composables/useLoaded'
import { deviceNow } from '~~/stores/posting'
import type { ShipmentReturns, ShipmentWithLines } from '~~/utils/contract/shipments'
import { massText, type MassReading } from '~~/utils/quantity/mass'
import type { ShipmentActsAnswer } from '~~/utils/shipment/acts'

/** A cylinder of a shipment that came back, as it was weighed in. */
export type ReturnedLine = Pick<ShipmentReturns['lines'][number], 'cylinderId' | 'gross'>

/** A shipment, what was done to it, and what may be done next; what is sent again for want of an answer is kept once. */
export function useShipment(id: string) {
  const api = useApi()
  const path = `/api/shipments/${id}`
  const list = useActedList<ShipmentWithLines>(path)
  const acts = useLoaded(`${path}/acts`, () => api.get<ShipmentActsAnswer>(`${path}/acts`))
  /** What is being sent, by its content, until it has succeeded. */
  const sending = new Map<string, { id: string, occurredAt: string }>()

  /** An id of its own and the time it was first sent, the same where it is sent again. */
  function stampOf(about: string): { id: string, occurredAt: string } {
    const known = sending.get(about) ?? { id: uuidv7(), occurredAt: deviceNow() }
    sending.set(about, known)
    return known
  }

  async function send(work: () => Promise<ShipmentWithLines>): Promise<boolean> {
    const isDone = await list.act(work)
    if (isDone) sending.clear()
    void acts.refresh()
    return isDone
  }

  function act(what: 'ready' | 'arrival' | 'cancel' | 'carrier', content: { reason?: string, carrierId?: string | null } = {}): Promise<boolean> {
    return send(() => api.post(`${path}/${what}`, { ...stampOf(what + JSON.stringify(content)), ...content }))
  }

  function putOn(cylinderIds: readonly string[]): Promise<boolean> {
    return send(() => api.patch(`${path}/lines`, {
      occurredAt: deviceNow(), add: cylinderIds.map(cylinderId => ({ id: stampOf(`on ${cylinderId}`).id, cylinderId })),
    }))
  }

  function takeOff(cylinderIds: readonly string[], reason: string): Promise<boolean> {
    return send(() => api.patch(`${path}/lines`, {
      occurredAt: deviceNow(), takeOff: cylinderIds.map(cylinderId => ({ id: stampOf(`off ${cylinderId} ${reason}`).id, cylinderId, reason })),
    }))
  }

  /** Puts the cylinder with a code, or a serial, on the list. */
  function add(typed: string): Promise<boolean> {
    return send(async () => {
      const cylinderId = await list.newOne(typed)
      return api.patch(`${path}/lines`, { occurredAt: deviceNow(), add: [{ id: stampOf(`on ${cylinderId}`).id, cylinderId }] })
    })
  }

  /** Keeps what the scale shows of the cylinder that was scanned. */
  function weigh(ref: string, gross: MassReading): Promise<boolean> {
    return send(() => api.post(`${path}/weighings`, { ...stampOf(`weighs ${ref} ${massText(gross)}`), ref, gross }))
  }

  function dispatch(): Promise<boolean> {
    const lines = (list.data.value?.lines ?? []).map(({ cylinder, version, weighed }) => ({
      cylinderId: cylinder.id, expects: version, gross: weighed?.gross, eventId: stampOf(`leaves ${cylinder.id} at ${version}`).id,
    }))
    const { occurredAt } = stampOf(`leaves ${JSON.stringify(lines)}`)
    return send(() => api.post(`${path}/dispatch`, { occurredAt, deviceNow: deviceNow(), lines }))
  }

  function takeBack(placeId: string, reason: string, lines: readonly ReturnedLine[]): Promise<boolean> {
    const { occurredAt } = stampOf(`back ${placeId} ${reason} ${JSON.stringify(lines)}`)
    return send(() => api.post(`${path}/returns`, {
      occurredAt, deviceNow: deviceNow(), placeId, reason,
      lines: lines.map(line => ({ ...line, eventId: stampOf(`back ${line.cylinderId} ${placeId} ${reason} ${massText(line.gross)}`).id })),
    }))
  }

  return { ...list, acts, act, putOn, takeOff, add, weigh, dispatch, takeBack }
}
