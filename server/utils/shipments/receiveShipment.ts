import type { Access } from '~~/utils/access/roles'
import type { ShipmentReceipt } from '~~/utils/contract/shipments'
import { areRecorded, effectOf, refuseOtherLines, refuseRefused } from '../cylinder-lists/lineCommands'
import { append } from '../custody/append'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { theShipment } from './shipments'
import { shipmentLines } from './shipmentLines'

/**
 * The reclaimer has taken a shipment over: its figures go into each cylinder's log and the lines are closed, in one
 * commit. The same request sent again changes nothing.
 *
 * Errors: 404; 409 where it has not left or is received already, where its lines are others, and where a cylinder has
 * changed since it was looked at.
 */
export async function receiveShipment(db: Database, id: string, body: ShipmentReceipt, access: Access, now: number): Promise<void> {
  const isRepeated = await areRecorded(db, body.lines.map(line => line.eventId))
  if (!isRepeated) await refuseUnlessDispatched(db, id)
  refuseOtherLines(body.lines.map(line => line.cylinderId), (await shipmentLines(db, id)).map(line => line.cylinderId))

  const events = body.lines.map(({ cylinderId, eventId, expects, ...figures }) => ({
    id: eventId, cylinderId, kind: 'reclaimed', occurredAt: body.occurredAt, expects, details: { shipmentId: id, ...figures },
  }))
  const deviceNow = body.deviceNow === undefined ? null : Date.parse(body.deviceNow)
  const eventIds = body.lines.map(line => line.eventId)
  try {
    refuseRefused(await append(db, { events, access, now, deviceNow, dispatch: { alongside: guard => arrival(id, eventIds, guard) } }))
  }
  catch (error) {
    // The commit fails where somebody else received it meanwhile; then that is told, else the error itself.
    if (!isRepeated) await refuseUnlessDispatched(db, id)
    throw error
  }
}

function arrival(id: string, eventIds: readonly string[], guard: Guard) {
  const effect = effectOf(eventIds)
  return [
    {
      // A shipment that is not on its way any more gets no state, which its column refuses: all is undone.
      sql: `UPDATE shipments SET state = CASE WHEN state IN ('dispatched', 'arrived') THEN 'settled' END, settled_at = ${effect.sql} WHERE id = ? AND ${guard.sql}`,
      args: [...effect.args, id, ...guard.args],
    },
    { sql: `DELETE FROM open_lines WHERE list_id = ? AND ${guard.sql}`, args: [id, ...guard.args] },
  ]
}

async function refuseUnlessDispatched(db: Database, id: string): Promise<void> {
  const { state } = await theShipment(db, id)
  if (state !== 'dispatched' && state !== 'arrived') throw problem(409, 'This shipment is not on its way', `It is ${state}.`)
}
