import type { Closing } from '~~/utils/contract/settlement'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from '../shipments/acts'
import { theShipment } from '../shipments/shipments'

/**
 * Closes a settled shipment. The same request sent again changes nothing.
 *
 * Errors: 404; 409 where it is not settled, and while a dispute is open.
 */
export async function closeShipment(db: Database, shipmentId: string, { id, occurredAt }: Closing, personId: string, now: number): Promise<void> {
  const act: NewAct = { id, shipmentId, kind: 'closed', by: { personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  const mayClose: Guard = {
    sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state = 'settled') AND NOT EXISTS (SELECT 1 FROM disputes WHERE shipment_id = ? AND ended_at IS NULL)`,
    args: [shipmentId, shipmentId],
  }
  const isOurs = isKeptNow(act)
  const [kept] = await db.write([
    actStatement(act, mayClose),
    { sql: `UPDATE shipments SET state = 'closed', closed_at = ? WHERE id = ? AND ${isOurs.sql}`, args: [act.occurredAt, shipmentId, ...isOurs.args] },
  ])
  if (kept?.rows.length === 1) return
  const { state, number } = await theShipment(db, shipmentId)
  if (state !== 'settled') throw problem(409, 'Only a settled shipment is closed', `Shipment ${number} is ${state}.`)
  throw problem(409, 'A dispute is open', 'End every dispute with its outcome, then close the shipment.', undefined, { type: 'dispute-open' })
}
