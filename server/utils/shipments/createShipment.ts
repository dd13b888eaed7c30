import { v7 as uuid } from 'uuid'
import type { NewShipment } from '~~/utils/contract/shipments'
import { actStatement } from './acts'
import { createDraft } from '../cylinder-lists/drafts'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'

/**
 * A draft of a shipment to a reclaimer; answers its id. The same draft sent again changes nothing.
 *
 * Errors: 422 for another sort of firm or an unknown cylinder; 409 for a cylinder on another list.
 */
export async function createShipment(db: Database, body: NewShipment, createdBy: string, now: number): Promise<string> {
  const firm = (await directory(db, true)).firms.get(body.toFirmId)
  if (firm?.kind !== 'reclaimer' || !firm.active) {
    throw problem(422, 'Not a reclaimer of ours', 'Choose the reclaimer that it goes to.', [{ path: 'toFirmId', message: 'must be a reclaimer in use' }])
  }
  const id = body.id ?? uuid()
  await createDraft(db, { kind: 'shipment', id }, {
    firmId: firm.id, note: body.note ?? null, cylinderIds: body.cylinderIds, createdBy, now,
    along: isMade => [actStatement({ id, shipmentId: id, kind: 'created', details: { cylinders: body.cylinderIds.length }, by: { personId: createdBy }, occurredAt: now, recordedAt: now }, isMade)],
  })
  return id
}
