import type { InStatement } from '@libsql/client'
import { v7 as uuid } from 'uuid'
import type { Access } from '~~/utils/access/roles'
import type { ShipmentReturns } from '~~/utils/contract/shipments'
import { areRecorded, refuseRefused } from '../cylinder-lists/lineCommands'
import { append } from '../custody/append'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { actStatement, claimedAt } from './acts'
import { shipmentFor } from './openShipment'
import { shipmentLines } from './shipmentLines'
import { theShipment } from './shipments'

/**
 * Takes cylinders back that a shipment had sent off: each is weighed in and free for other lists; the shipment goes on
 * with the rest. With its last line back there is nothing to settle, and it is closed unless a dispute is open, which is
 * ended first. The same request sent again changes nothing.
 *
 * Errors: 404; 409 where it has not left or is settled, and where a line is none of it or came back already.
 */
export async function returnLines(db: Database, shipmentId: string, body: ShipmentReturns, access: Access, now: number): Promise<void> {
  const isRepeated = await areRecorded(db, body.lines.map(line => line.eventId))
  const { to } = isRepeated ? await theShipment(db, shipmentId) : await shipmentFor(db, shipmentId, 'return')
  if (!isRepeated) await refuseUnlessAway(db, shipmentId, body)

  const events = body.lines.map(({ cylinderId, eventId, gross }) => ({
    id: eventId, cylinderId, kind: 'returned', occurredAt: body.occurredAt, placeId: body.placeId, note: body.reason, details: { fromFirmId: to.id, gross },
  }))
  const deviceNow = body.deviceNow === undefined ? null : Date.parse(body.deviceNow)
  try {
    refuseRefused(await append(db, { events, access, now, deviceNow, dispatch: { alongside: guard => comingBack(shipmentId, body, { access, now }, guard) } }))
  }
  catch (error) {
    // The commit fails where the shipment or a line changed under us; then the reason is told, else the error itself.
    if (!isRepeated) {
      await shipmentFor(db, shipmentId, 'return')
      await refuseUnlessAway(db, shipmentId, body)
    }
    throw error
  }
}

async function refuseUnlessAway(db: Database, shipmentId: string, { lines }: ShipmentReturns): Promise<void> {
  const stored = new Map((await shipmentLines(db, shipmentId)).map(line => [line.cylinderId, line]))
  const errors = lines.flatMap(({ cylinderId }, index) => {
    const line = stored.get(cylinderId)
    if (!line) return [{ path: `lines.${index}.cylinderId`, message: 'does not stand on it' }]
    return line.returnedAt === null ? [] : [{ path: `lines.${index}.cylinderId`, message: 'came back already' }]
  })
  if (errors.length > 0) throw problem(409, 'The lines have changed', 'Look at the list again, then decide.', errors)
}

function comingBack(shipmentId: string, body: ShipmentReturns, { access: { personId }, now }: { access: Access, now: number }, guard: Guard): InStatement[] {
  const at = claimedAt(body.occurredAt, now)
  const act = (line: ShipmentReturns['lines'][number]): Parameters<typeof actStatement>[0] => ({
    id: line.eventId, shipmentId, cylinderId: line.cylinderId, kind: 'returned', details: { gross: line.gross, placeId: body.placeId, reason: body.reason },
    by: { personId }, occurredAt: at, recordedAt: now,
  })
  const isDone = `(SELECT count(*) FROM shipment_lines WHERE shipment_id = shipments.id)
      = (SELECT count(DISTINCT cylinder_id) FROM shipment_acts WHERE shipment_id = shipments.id AND kind = 'returned')
    AND NOT EXISTS (SELECT 1 FROM disputes WHERE shipment_id = shipments.id AND ended_at IS NULL)`
  const ids = JSON.stringify(body.lines.map(line => line.cylinderId))
  return [
    {
      // A shipment that is settled meanwhile, or of which one of these is back, gets no state, which its column refuses: all is undone.
      sql: `UPDATE shipments SET state = CASE WHEN state IN ('dispatched', 'arrived') AND NOT EXISTS (
          SELECT 1 FROM shipment_acts WHERE shipment_id = shipments.id AND kind = 'returned' AND cylinder_id IN (SELECT value FROM json_each(?))
        ) THEN state END WHERE id = ? AND ${guard.sql}`,
      args: [ids, shipmentId, ...guard.args],
    },
    ...body.lines.map(line => actStatement(act(line), guard)),
    {
      sql: `DELETE FROM open_lines WHERE list_id = ? AND cylinder_id IN (SELECT value FROM json_each(?)) AND ${guard.sql}`,
      args: [shipmentId, ids, ...guard.args],
    },
    actStatement({
      id: uuid(), shipmentId, kind: 'closed', details: { why: 'All of it came back.' }, by: { personId }, occurredAt: at, recordedAt: now,
    }, { sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND ${isDone}) AND ${guard.sql}`, args: [shipmentId, ...guard.args] }),
    {
      sql: `UPDATE shipments SET state = 'closed', closed_at = ? WHERE id = ? AND ${isDone} AND ${guard.sql}`,
      args: [at, shipmentId, ...guard.args],
    },
  ]
}
