import type { InStatement } from '@libsql/client'
import type { Access } from '~~/utils/access/roles'
import type { ShipmentDispatch, ShipmentWithLines } from '~~/utils/contract/shipments'
import { massText, readingGrams } from '~~/utils/quantity/mass'
import { stepFacts } from '~~/utils/shipment/steps'
import { areRecorded, effectOf, hasLines, refuseOtherLines, refuseRefused } from '../cylinder-lists/lineCommands'
import { append } from '../custody/append'
import type { Guard, Posting } from '../custody/posting'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { actStatement, claimedAt } from './acts'
import { refuseStep } from './refuseStep'
import { judgedShipment, shipmentWithLines, type ShipmentJudged } from './shipmentWithLines'

/**
 * Sends a shipment off that is ready: every line leaves with the weight it was made ready with, its papers are kept as
 * they are then, in one commit, or nothing does. The same request sent again changes nothing.
 *
 * Errors: 404; 409 where it has left already, is not ready, or its papers lack something, where its lines or weights are
 * others, where a cylinder has changed since it was looked at, and with the reasons of each line that may not leave.
 */
export async function dispatchShipment(db: Database, id: string, body: ShipmentDispatch, access: Access, now: number): Promise<void> {
  const { shipment, judged } = await judgedShipment(db, id, access, now)
  const isRepeated = shipment.dispatchedAt !== null && await areRecorded(db, body.lines.map(line => line.eventId))
  const posting: Posting = {
    events: await eventsOf(db, id, shipment.to.id, body), access, now, deviceNow: body.deviceNow === undefined ? null : Date.parse(body.deviceNow),
  }
  if (isRepeated) return refuseRefused(await append(db, { ...posting, dispatch: { alongside: () => [] } }))

  refuseUnlessAsTold(shipment, body)
  try {
    refuseRefused(await append(db, { ...posting, dispatch: { alongside: guard => departure(shipment, judged!, { body, access, now }, guard) } }))
  }
  catch (error) {
    // The commit fails where the shipment or its lines changed under us; then the reason is told, else the error itself.
    refuseUnlessAsTold(await shipmentWithLines(db, id, access, now), body)
    throw error
  }
}

/** Errors: 409 where it may not leave, or is not what the sender has looked at. */
function refuseUnlessAsTold(shipment: ShipmentWithLines, { lines }: ShipmentDispatch): void {
  if (shipment.dispatchedAt !== null) {
    throw problem(409, 'It has left already', `${shipment.dispatchedBy ?? 'Somebody'} sent it off. Nothing was recorded a second time.`, undefined, { type: 'already-left' })
  }
  refuseOtherLines(lines.map(line => line.cylinderId), shipment.lines.map(line => line.cylinder.id))
  refuseStep('dispatch', stepFacts(shipment))
  const grossOf = new Map(shipment.lines.map(({ cylinder, weighed }) => [cylinder.id, weighed && massText(weighed.gross)]))
  const errors = lines.flatMap(({ cylinderId, gross }, index) =>
    grossOf.get(cylinderId) === massText(gross) ? [] : [{ path: `lines.${index}.gross`, message: 'is another weight than it was made ready with' }])
  if (errors.length > 0) throw problem(409, 'The lines have changed', 'Look at the list again, then decide.', errors)
}

async function eventsOf(db: Database, shipmentId: string, firmId: string, body: ShipmentDispatch) {
  const placeId = (await directory(db)).placeOfFirm.get(firmId)
  return body.lines.map(({ cylinderId, eventId, expects, gross }) => ({
    id: eventId, cylinderId, kind: 'sent-for-reclaim', occurredAt: body.occurredAt, placeId, expects, details: { shipmentId, gross },
  }))
}

interface Leaving { body: ShipmentDispatch, access: Access, now: number }

function departure({ id, readyAt }: ShipmentWithLines, { lines, papers }: ShipmentJudged, { body, access: { personId }, now }: Leaving, guard: Guard): InStatement[] {
  const same = hasLines({ kind: 'shipment', id }, body.lines.map(line => line.cylinderId))
  const eventIds = body.lines.map(line => line.eventId)
  const effect = effectOf(eventIds)
  return [
    {
      // A shipment that is not ready with these lines any more gets no state, which its column refuses: all is undone.
      sql: `UPDATE shipments SET state = CASE WHEN state = 'ready' AND ready_at = ? AND ${same.sql} THEN 'dispatched' END,
          dispatched_at = ${effect.sql}, dispatched_by = ?, papers = ?
        WHERE id = ? AND ${guard.sql}`,
      args: [Date.parse(readyAt!), ...same.args, ...effect.args, personId, JSON.stringify(papers), id, ...guard.args],
    },
    ...body.lines.map(({ cylinderId, gross }) => ({
      sql: `UPDATE shipment_lines SET sent = ? WHERE shipment_id = ? AND cylinder_id = ? AND ${guard.sql}`,
      args: [JSON.stringify({ ...lines.get(cylinderId)!.figures, gross, grossGrams: readingGrams(gross) }), id, cylinderId, ...guard.args],
    })),
    actStatement({
      id: eventIds[0]!, shipmentId: id, kind: 'dispatched', details: { cylinders: body.lines.length }, by: { personId }, occurredAt: claimedAt(body.occurredAt, now), recordedAt: now,
    }, guard),
  ]
}
