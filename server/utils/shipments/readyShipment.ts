import type { Access } from '~~/utils/access/roles'
import type { OwnAct } from '~~/utils/contract/shipments'
import { hasLines } from '../cylinder-lists/lineCommands'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from './acts'
import { stepFacts } from '~~/utils/shipment/steps'
import { refuseStep } from './refuseStep'
import { HAS_UNWEIGHED } from './shipments'
import { shipmentWithLines } from './shipmentWithLines'

/**
 * Says that a shipment may leave: each line is scanned and weighed, nothing holds one back, and it is known who carries
 * it. Sent again it changes nothing.
 *
 * Errors: 404; 409 with what is still wanting.
 */
export async function readyShipment(db: Database, shipmentId: string, { id, occurredAt }: OwnAct, access: Access, now: number): Promise<void> {
  const act: NewAct = { id, shipmentId, kind: 'ready', by: { personId: access.personId }, occurredAt: claimedAt(occurredAt, now), recordedAt: now }
  if (await isKept(db, act)) return
  const shipment = await shipmentWithLines(db, shipmentId, access, now)
  refuseStep('ready', stepFacts(shipment))

  const same = hasLines({ kind: 'shipment', id: shipmentId }, shipment.lines.map(line => line.cylinder.id))
  const isNew = isKeptNow(act)
  const [kept] = await db.write([
    actStatement(act, {
      // Its column may still say that it is ready where a cylinder was changed since, and a line then weighed again.
      sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state = 'draft' AND NOT ${HAS_UNWEIGHED}) AND ${same.sql}`, args: [shipmentId, ...same.args],
    }),
    { sql: `UPDATE shipments SET state = 'ready', ready_at = ? WHERE id = ? AND ${isNew.sql}`, args: [act.occurredAt, shipmentId, ...isNew.args] },
  ])
  if (kept?.rows.length === 1 || await isKept(db, act)) return
  refuseStep('ready', stepFacts(await shipmentWithLines(db, shipmentId, access, now)))
  throw problem(409, 'It is not ready', 'Somebody changed it just now. Look at it again.')
}
