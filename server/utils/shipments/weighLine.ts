import type { Weighing } from '~~/utils/contract/shipments'
import { theCylinder } from '../custody/theCylinder'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from './acts'
import { backToDraft } from './backToDraft'
import { isOpen, refuseUnlessOpen } from './openShipment'
import { shipmentLines } from './shipmentLines'

/**
 * Keeps what the scale showed of a cylinder of a shipment, as it was scanned; the newest weighing counts. A shipment that
 * was ready is a draft again. The same weighing sent again changes nothing.
 *
 * Errors: 404 for a scan that names no cylinder, and where there is no such shipment; 409 where it has left, and
 * (`not-on-list`) where the cylinder does not stand on it.
 */
export async function weighLine(db: Database, shipmentId: string, body: Weighing, personId: string, now: number): Promise<void> {
  const cylinderId = await theCylinder(db, body.ref)
  const at = claimedAt(body.occurredAt, now)
  const act: NewAct = { id: body.id, shipmentId, kind: 'weighed', cylinderId, details: { gross: body.gross, ref: body.ref }, by: { personId }, occurredAt: at, recordedAt: now }
  if (await isKept(db, act)) return
  await refuseUnlessOpen(db, shipmentId)
  await refuseUnlessOnIt(db, shipmentId, cylinderId)

  const open = isOpen(shipmentId)
  const isNew = isKeptNow(act)
  const [kept] = await db.write([
    actStatement(act, {
      sql: `${open.sql} AND EXISTS (SELECT 1 FROM shipment_lines WHERE shipment_id = ? AND cylinder_id = ?)`, args: [...open.args, shipmentId, cylinderId],
    }),
    {
      sql: `UPDATE shipment_lines SET weighed = json_object('gross', json(?), 'at', ?, 'by', ?, 'version', (SELECT version FROM cylinders WHERE id = ?))
        WHERE shipment_id = ? AND cylinder_id = ? AND ${isNew.sql}`,
      args: [JSON.stringify(body.gross), at, personId, cylinderId, shipmentId, cylinderId, ...isNew.args],
    },
    ...backToDraft(shipmentId, { why: 'A line was weighed again.', personId, now }, isNew),
  ])
  if (kept?.rows.length === 1 || await isKept(db, act)) return
  await refuseUnlessOpen(db, shipmentId)
  await refuseUnlessOnIt(db, shipmentId, cylinderId)
}

async function refuseUnlessOnIt(db: Database, shipmentId: string, cylinderId: string): Promise<void> {
  const lines = await shipmentLines(db, shipmentId)
  if (lines.some(line => line.cylinderId === cylinderId)) return
  throw problem(409, 'It is not on this shipment', 'Put it on the list first, or set it aside.', undefined, { type: 'not-on-list' })
}
