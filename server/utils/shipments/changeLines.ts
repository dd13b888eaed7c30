import type { InStatement } from '@libsql/client'
import type { LineChanges } from '~~/utils/contract/shipments'
import { freeFor, refuseUnfree } from '../cylinder-lists/freeCylinders'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt, isKept, isKeptNow, type NewAct } from './acts'
import { backToDraft } from './backToDraft'
import { refuseUnlessOpen } from './openShipment'

/** Cylinders on a shipment at most: as many as one answer lists. */
const MOST_LINES = 200

/**
 * Puts cylinders on a shipment that has not left, and takes others off it with a reason; what was weighed of the rest
 * stays. A shipment that was ready is a draft again. The same changes sent again change nothing.
 *
 * Errors: 404; 409 where it has left, where it would be too long; 422 and 409 as {@link refuseUnfree}.
 */
export async function changeLines(db: Database, shipmentId: string, body: LineChanges, personId: string, now: number): Promise<void> {
  const common = { shipmentId, by: { personId }, occurredAt: claimedAt(body.occurredAt, now), recordedAt: now }
  const added = body.add.map(({ id, cylinderId }): NewAct & { cylinderId: string } => ({ ...common, id, cylinderId, kind: 'line-added' }))
  const off = body.takeOff.map(({ id, cylinderId, reason }): NewAct & { cylinderId: string } => ({ ...common, id, cylinderId, kind: 'line-removed', details: { reason } }))
  const kept = await Promise.all([...added, ...off].map(act => isKept(db, act)))
  if (kept.length === 0 || kept.every(one => one)) return

  const list = { kind: 'shipment' as const, id: shipmentId }
  const addedIds = added.map(act => act.cylinderId)
  await refuseUnlessOpen(db, shipmentId)
  await refuseUnfree(db, list, addedIds)
  const free = freeFor(list, addedIds)
  const fits: Guard = {
    sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state IN ('draft', 'ready')) AND ${free.sql}
      AND (SELECT count(*) FROM shipment_lines WHERE shipment_id = ?) + ? <= ?`,
    args: [shipmentId, ...free.args, shipmentId, added.length, MOST_LINES],
  }
  const answers = await db.write([
    { sql: `SELECT 1 WHERE ${fits.sql}`, args: fits.args },
    ...off.flatMap(act => takenOff(act, fits)),
    ...added.flatMap(act => putOn(act, fits)),
    ...backToDraft(shipmentId, { why: 'Its lines were changed.', personId, now }, anyKept([...added, ...off])),
  ])
  if (answers[0]?.rows.length === 1) return
  await refuseUnlessOpen(db, shipmentId)
  await refuseUnfree(db, list, addedIds)
  throw problem(409, 'The list was not changed', `A shipment has ${MOST_LINES} cylinders at most.`)
}

/** The act is kept only where the cylinder does not stand on it yet. */
function putOn(act: NewAct & { cylinderId: string }, fits: Guard): InStatement[] {
  const { shipmentId, cylinderId } = act
  const isNew = isKeptNow(act)
  return [
    actStatement(act, { sql: `NOT EXISTS (SELECT 1 FROM shipment_lines WHERE shipment_id = ? AND cylinder_id = ?) AND ${fits.sql}`, args: [shipmentId, cylinderId, ...fits.args] }),
    {
      sql: `INSERT INTO open_lines (cylinder_id, list_kind, list_id) SELECT ?, 'shipment', ? WHERE ${isNew.sql} ON CONFLICT DO NOTHING`,
      args: [cylinderId, shipmentId, ...isNew.args],
    },
    {
      sql: `INSERT INTO shipment_lines (shipment_id, cylinder_id, position)
        SELECT ?, ?, (SELECT coalesce(max(position), -1) + 1 FROM shipment_lines WHERE shipment_id = ?) WHERE ${isNew.sql} ON CONFLICT DO NOTHING`,
      args: [shipmentId, cylinderId, shipmentId, ...isNew.args],
    },
  ]
}

function takenOff(act: NewAct & { cylinderId: string }, fits: Guard): InStatement[] {
  const { shipmentId, cylinderId } = act
  const isNew = isKeptNow(act)
  return [
    actStatement(act, { sql: `EXISTS (SELECT 1 FROM shipment_lines WHERE shipment_id = ? AND cylinder_id = ?) AND ${fits.sql}`, args: [shipmentId, cylinderId, ...fits.args] }),
    { sql: `DELETE FROM open_lines WHERE list_id = ? AND cylinder_id = ? AND ${isNew.sql}`, args: [shipmentId, cylinderId, ...isNew.args] },
    { sql: `DELETE FROM shipment_lines WHERE shipment_id = ? AND cylinder_id = ? AND ${isNew.sql}`, args: [shipmentId, cylinderId, ...isNew.args] },
  ]
}

function anyKept(acts: readonly NewAct[]): Guard {
  return {
    sql: 'EXISTS (SELECT 1 FROM shipment_acts WHERE recorded_at = ? AND id IN (SELECT value FROM json_each(?)))',
    args: [acts[0]!.recordedAt, JSON.stringify(acts.map(act => act.id))],
  }
}
