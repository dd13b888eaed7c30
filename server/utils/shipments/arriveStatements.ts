import type { InStatement } from '@libsql/client'
import type { ActBy } from '~~/utils/shipment/acts'
import type { Guard } from '../custody/posting'
import { actStatement } from './acts'

/** That a shipment has arrived. Units: instants in UTC milliseconds. */
export interface Arrival {
  /** Of the act. */
  id: string
  by: ActBy
  occurredAt: number
  recordedAt: number
}

/** Notes that a shipment on its way has arrived, for a commit of the caller's; where it is not on its way they change nothing. */
export function arriveStatements(shipmentId: string, arrival: Arrival, where: Guard = { sql: '1', args: [] }): InStatement[] {
  return [
    actStatement({ ...arrival, shipmentId, kind: 'arrived' }, {
      sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state = 'dispatched') AND ${where.sql}`, args: [shipmentId, ...where.args],
    }),
    {
      sql: `UPDATE shipments SET state = 'arrived', arrived_at = ? WHERE id = ? AND state = 'dispatched' AND ${where.sql}`,
      args: [arrival.occurredAt, shipmentId, ...where.args],
    },
  ]
}
