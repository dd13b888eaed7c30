import { randomUUID } from 'node:crypto'
import type { Database } from '../../server/utils/database/database'
import { chooseCarrier } from '../../server/utils/shipments/chooseCarrier'
import { readyShipment } from '../../server/utils/shipments/readyShipment'
import { weighLine } from '../../server/utils/shipments/weighLine'
import type { Access } from '../../utils/access/roles'
import type { ShipmentWithLines } from '../../utils/contract/shipments'
import type { MassReading } from '../../utils/quantity/mass'
import type { TestClient } from './client'

interface Weighed { cylinderId: string, gross: MassReading }

const act = (now: number) => ({ id: randomUUID(), occurredAt: new Date(now).toISOString() })

/** Weighs each line of a shipment, has our own vehicle carry it and makes it ready; a telephone for emergencies is set. */
export async function madeReady(db: Database, shipmentId: string, lines: readonly Weighed[], access: Access, now: number): Promise<void> {
  await db.write([{ sql: `UPDATE firm SET emergency_telephone = '+1 555 0100'`, args: [] }])
  for (const { cylinderId, gross } of lines) await weighLine(db, shipmentId, { ...act(now), ref: cylinderId, gross }, access.personId, now)
  await chooseCarrier(db, shipmentId, { ...act(now), carrierId: null }, access.personId, now)
  await readyShipment(db, shipmentId, act(now), access, now)
}

/** The same over HTTP; answers the shipment as it is then. */
export async function readied(client: TestClient, shipmentId: string, lines: readonly Weighed[]): Promise<ShipmentWithLines> {
  const path = `/api/shipments/${shipmentId}`
  const post = async (what: string, body: object) => {
    const answer = await client.post<ShipmentWithLines>(`${path}/${what}`, { ...act(Date.now()), ...body })
    if (answer.status !== 200) throw new Error(`${what} answered ${answer.status}: ${JSON.stringify(answer.body)}`)
    return answer.body
  }
  for (const { cylinderId, gross } of lines) await post('weighings', { ref: cylinderId, gross })
  await post('carrier', { carrierId: null })
  return post('ready', {})
}
