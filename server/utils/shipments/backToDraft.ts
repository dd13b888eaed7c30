import type { InStatement } from '@libsql/client'
import { v7 as uuid } from 'uuid'
import type { Guard } from '../custody/posting'
import { actStatement } from './acts'

/** A shipment that was made ready is so no longer: something about it was changed, under a condition. Units: UTC milliseconds. */
export function backToDraft(shipmentId: string, by: { why: string, personId: string, now: number }, guard: Guard): InStatement[] {
  const isReady: Guard = { sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state = 'ready') AND ${guard.sql}`, args: [shipmentId, ...guard.args] }
  return [
    actStatement({
      id: uuid(), shipmentId, kind: 'unready', details: { why: by.why }, by: { personId: by.personId }, occurredAt: by.now, recordedAt: by.now,
    }, isReady),
    { sql: `UPDATE shipments SET state = 'draft', ready_at = NULL WHERE id = ? AND state = 'ready' AND ${guard.sql}`, args: [shipmentId, ...guard.args] },
  ]
}
