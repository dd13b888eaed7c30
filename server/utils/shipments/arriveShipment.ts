import type { OwnAct } from '~~/utils/contract/shipments'
import type { Database } from '../database/database'
import { claimedAt, isKept, type NewAct } from './acts'
import { arriveStatements } from './arriveStatements'
import { shipmentFor } from './openShipment'

/** Notes that a shipment has arrived, as we were told. Sent again it changes nothing. Errors: 404; 409 where it is not on its way. */
export async function arriveShipment(db: Database, shipmentId: string, { id, occurredAt }: OwnAct, personId: string, now: number): Promise<void> {
  const act: NewAct = { id, shipmentId, kind: 'arrived', by: { personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  await shipmentFor(db, shipmentId, 'arrive')
  const [kept] = await db.write(arriveStatements(shipmentId, act))
  if (kept?.rows.length !== 1) await shipmentFor(db, shipmentId, 'arrive')
}
