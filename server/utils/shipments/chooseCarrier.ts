import type { CarrierChoice } from '~~/utils/contract/shipments'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from './acts'
import { backToDraft } from './backToDraft'
import { isOpen, refuseUnlessOpen } from './openShipment'

/**
 * Says who carries a shipment: a carrier, or our own vehicle (null). One that was ready is a draft again. Sent again it
 * changes nothing.
 *
 * Errors: 404; 409 where it has left; 422 for another sort of firm.
 */
export async function chooseCarrier(db: Database, shipmentId: string, { id, occurredAt, carrierId }: CarrierChoice, personId: string, now: number): Promise<void> {
  const act: NewAct = { id, shipmentId, kind: 'carrier-chosen', details: { carrierId }, by: { personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  await refuseUnlessOpen(db, shipmentId)
  const carrier = carrierId === null ? null : (await directory(db, true)).firms.get(carrierId)
  if (carrier !== null && (carrier?.kind !== 'carrier' || !carrier.active)) {
    throw problem(422, 'Not a carrier of ours', 'Choose who carries it.', [{ path: 'carrierId', message: 'must be a carrier in use' }])
  }
  const isNew = isKeptNow(act)
  const [kept] = await db.write([
    actStatement(act, isOpen(shipmentId)),
    { sql: `UPDATE shipments SET carrier_id = ? WHERE id = ? AND ${isNew.sql}`, args: [carrierId, shipmentId, ...isNew.args] },
    ...backToDraft(shipmentId, { why: 'Another carries it.', personId, now }, isNew),
  ])
  if (kept?.rows.length !== 1) await refuseUnlessOpen(db, shipmentId)
}
