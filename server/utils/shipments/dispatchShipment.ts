import type { InStatement } from '@libsql/client'
import type { Access } from '~~/utils/access/roles'
import type { ShipmentDispatch } from '~~/utils/contract/shipments'
import { areRecorded, effectOf, hasLines, refuseHeldBack, refuseOtherLines, refuseRefused } from '../cylinder-lists/lineCommands'
import { refuseUnlessDraft } from '../cylinder-lists/drafts'
import { append } from '../custody/append'
import type { Guard, Posting } from '../custody/posting'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { afterWeighing, type WeighedLine } from './afterWeighing'
import { theShipment } from './shipments'
import { shipmentLines } from './shipmentLines'

/**
 * Sends a draft off: every line leaves with the weight just read, in one commit, or nothing does. The same request sent
 * again changes nothing.
 *
 * Errors: 404; 409 where it has left already, where its lines are others, where a cylinder has changed since it was
 * looked at, and with the reasons of each line that may not leave.
 */
export async function dispatchShipment(db: Database, id: string, body: ShipmentDispatch, access: Access, now: number): Promise<void> {
  const shipment = await theShipment(db, id)
  const isRepeated = shipment.state !== 'draft' && await areRecorded(db, body.lines.map(line => line.eventId))
  if (!isRepeated) await refuseUnlessDraft(db, { kind: 'shipment', id })

  const events = await eventsOf(db, id, shipment.to.id, body)
  const posting: Posting = { events, access, now, deviceNow: body.deviceNow === undefined ? null : Date.parse(body.deviceNow) }
  if (isRepeated) return refuseRefused(await append(db, { ...posting, dispatch: { alongside: () => [] } }))

  refuseOtherLines(body.lines.map(line => line.cylinderId), (await shipmentLines(db, id)).map(line => line.cylinderId))
  const lines = await afterWeighing(db, body.lines, access, now)
  refuseHeldBack(lines.map(line => line.because))
  const eventIds = body.lines.map(line => line.eventId)
  try {
    refuseRefused(await append(db, { ...posting, dispatch: { alongside: guard => departure(id, lines, { eventIds, dispatchedBy: access.personId }, guard) } }))
  }
  catch (error) {
    // The commit fails where the draft or its lines changed under us; then the reason is told, else the error itself.
    await refuseUnlessDraft(db, { kind: 'shipment', id })
    refuseOtherLines(body.lines.map(line => line.cylinderId), (await shipmentLines(db, id)).map(line => line.cylinderId))
    throw error
  }
}

async function eventsOf(db: Database, shipmentId: string, firmId: string, body: ShipmentDispatch) {
  const placeId = (await directory(db)).placeOfFirm.get(firmId)
  return body.lines.map(({ cylinderId, eventId, expects, gross }) => ({
    id: eventId, cylinderId, kind: 'sent-for-reclaim', occurredAt: body.occurredAt, placeId, expects, details: { shipmentId, gross },
  }))
}

function departure(id: string, lines: readonly WeighedLine[], by: { eventIds: readonly string[], dispatchedBy: string }, guard: Guard): InStatement[] {
  const same = hasLines({ kind: 'shipment', id }, lines.map(line => line.cylinderId))
  const effect = effectOf(by.eventIds)
  return [
    {
      // A shipment that is no draft with these lines any more gets no state, which its column refuses: all is undone.
      sql: `UPDATE shipments SET state = CASE WHEN state = 'draft' AND ${same.sql} THEN 'dispatched' END, dispatched_at = ${effect.sql}, dispatched_by = ?
        WHERE id = ? AND ${guard.sql}`,
      args: [...same.args, ...effect.args, by.dispatchedBy, id, ...guard.args],
    },
    ...lines.map(({ cylinderId, sent }) => ({
      sql: `UPDATE shipment_lines SET sent = ? WHERE shipment_id = ? AND cylinder_id = ? AND ${guard.sql}`,
      args: [JSON.stringify(sent), id, cylinderId, ...guard.args],
    })),
  ]
}
