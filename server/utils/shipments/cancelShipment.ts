import type { Cancelling } from '~~/utils/contract/shipments'
import type { Database } from '../database/database'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from './acts'
import { isOpen, shipmentFor } from './openShipment'

/**
 * Gives a shipment up that has not left, with the reason; its cylinders are free for other lists. Sent again it changes
 * nothing.
 *
 * Errors: 404; 409 where it has left, for that has happened: what left can only come back.
 */
export async function cancelShipment(db: Database, shipmentId: string, { id, occurredAt, reason }: Cancelling, personId: string, now: number): Promise<void> {
  const act: NewAct = { id, shipmentId, kind: 'cancelled', details: { reason }, by: { personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  await shipmentFor(db, shipmentId, 'cancel')
  const isNew = isKeptNow(act)
  const [kept] = await db.write([
    actStatement(act, isOpen(shipmentId)),
    { sql: `UPDATE shipments SET state = 'cancelled', cancelled_at = ? WHERE id = ? AND ${isNew.sql}`, args: [act.occurredAt, shipmentId, ...isNew.args] },
    { sql: `DELETE FROM open_lines WHERE list_id = ? AND ${isNew.sql}`, args: [shipmentId, ...isNew.args] },
  ])
  if (kept?.rows.length !== 1) await shipmentFor(db, shipmentId, 'cancel')
}
