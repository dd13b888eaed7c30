import { randomUUID } from 'node:crypto'
import type { Stamp } from '../../utils/capacity/types'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { MintAnswer } from '../../utils/contract/labels'
import type { Firm, Place } from '../../utils/contract/places'
import type { CylinderView } from '../../utils/custody/cylinderView'
import type { MassReading } from '../../utils/quantity/mass'
import type { TestClient } from './client'
import { addMember, setUpFirm, type Member } from './firm'
import type { TestServer } from './server'
import { lb, stampOf } from './stamps'

/** A small firm at work: one person of each role, a shop, a reclaimer and a test station. */
export interface Shop {
  admin: Member
  warehouse: Member
  technician: Member
  manager: Member
  auditor: Member
  shop: Place
  reclaimer: Firm
  requalifier: Firm
}

/** Sets the firm up on a fresh server. */
export async function openShop(server: TestServer): Promise<Shop> {
  const admin = await setUpFirm(server)
  const warehouse = await addMember(admin, 'Wes', ['warehouse'])
  const technician = await addMember(admin, 'Tina', ['technician'])
  const manager = await addMember(admin, 'Mona', ['manager'])
  const auditor = await addMember(admin, 'Otto', ['auditor'])
  const shop = await made<Place>(admin.client, '/api/places', { name: 'North shop', kind: 'shop' })
  const reclaimer = await made<Firm>(admin.client, '/api/firms', { name: 'Tarnvale Reclaim', kind: 'reclaimer' })
  const requalifier = await made<Firm>(admin.client, '/api/firms', { name: 'Ostwick Cylinder Tests', kind: 'requalifier', rin: 'A123' })
  await admin.client.patch('/api/firm', { emergencyTelephone: '+1 555 0142' })
  return { admin, warehouse, technician, manager, auditor, shop, reclaimer, requalifier }
}

/** What a POST has made. */
export async function made<T>(client: TestClient, path: string, body: unknown): Promise<T> {
  const answer = await client.post<T>(path, body)
  if (answer.status !== 201) throw new Error(`POST ${path} answered ${answer.status}: ${JSON.stringify(answer.body)}`)
  return answer.body
}

interface Registration {
  stamp?: Partial<Stamp>
  marks?: { month: string }[]
  contents?: 'evacuated' | 'unknown' | { refrigerant: string, condition: string }
  gross?: MassReading
  /** Without a label it may not leave. */
  isLabelled?: boolean
}

let serials = 0

/** A cylinder registered and labelled by the warehouse; holds 12.5 lb of clean R-22 unless told otherwise. */
export async function registered({ warehouse, shop }: Shop, changes: Registration = {}): Promise<CylinderView> {
  const { stamp, marks = [{ month: '2025-06' }], contents = { refrigerant: 'R-22', condition: 'clean' }, isLabelled = true } = changes
  const cylinderId = randomUUID()
  const gross = changes.gross ?? (contents === 'evacuated' ? undefined : lb(40))
  const events: object[] = [{
    ...eventOf(cylinderId, 'registered'), placeId: shop.id,
    details: { stamp: stampOf({ serial: `S${++serials}`, ...stamp }), marks, ownership: 'own', contents, ...(gross && { gross }) },
  }]
  if (isLabelled) {
    const { codes } = await made<MintAnswer>(warehouse.client, '/api/labels', { count: 1 })
    events.push({ ...eventOf(cylinderId, 'labelled'), details: { code: codes[0] } })
  }
  return (await posted(warehouse.client, events))[0]!
}

/** The envelope of an event that happens now. */
export function eventOf(cylinderId: string, kind: string) {
  return { id: randomUUID(), cylinderId, kind, occurredAt: new Date().toISOString() }
}

/** Posts events that must all be accepted; answers the cylinders as they then stand. */
export async function posted(client: TestClient, events: object[]): Promise<CylinderView[]> {
  const { status, body } = await client.post<EventsAnswer>('/api/events', { events })
  if (status !== 200 || body.results.some(result => result.outcome !== 'accepted')) {
    throw new Error(`The events answered ${status}: ${JSON.stringify(body)}`)
  }
  return body.cylinders
}

/** A cylinder as it stands, for this person. */
export async function cylinderNow(client: TestClient, id: string): Promise<CylinderView> {
  return (await client.get<CylinderView>(`/api/cylinders/${id}`)).body
}
