import type { Row } from '@libsql/client'
import type { Shipment, ShipmentsAnswer, ShipmentsQuery } from '~~/utils/contract/shipments'
import { instantText, pageByNumber, pageFilter } from '../cylinder-lists/paging'
import type { Database } from '../database/database'
import { problem } from '../http/problem'

const NET = `CASE WHEN shipments.state IN ('draft', 'ready') THEN cylinders.net_grams ELSE json_extract(line.sent, '$.netGrams') END`

/** Whether a shipment has a line of which something was recorded since it was weighed, or which was never weighed. */
export const HAS_UNWEIGHED = `EXISTS (SELECT 1 FROM shipment_lines AS one LEFT JOIN cylinders AS its ON its.id = one.cylinder_id
  WHERE one.shipment_id = shipments.id AND json_extract(one.weighed, '$.version') IS NOT its.version)`

/** What a shipment is: made ready it is a draft again as soon as a line of it is to be weighed again. */
const STATE = `CASE WHEN shipments.state = 'ready' AND ${HAS_UNWEIGHED} THEN 'draft' ELSE shipments.state END`

/** Who carries it; our own vehicle where that was said and no firm was named. */
const HAS_CARRIER = `EXISTS (SELECT 1 FROM shipment_acts WHERE shipment_id = shipments.id AND kind = 'carrier-chosen')`

/** A shipment with the count of its lines and the sum of their known nets: as they are until it leaves, as they left afterwards. */
const SELECT_SHIPMENTS = `SELECT shipments.id, shipments.number, shipments.to_firm_id, firms.name AS to_name, ${STATE} AS state, shipments.note,
    shipments.carrier_id, carriers.name AS carrier_name, ${HAS_CARRIER} AS has_carrier,
    shipments.created_at, shipments.dispatched_at, people.name AS dispatched_by_name, shipments.ready_at, shipments.arrived_at, shipments.settled_at,
    shipments.closed_at, shipments.cancelled_at, count(line.cylinder_id) AS line_count, sum(${NET}) AS net_grams
  FROM shipments
  JOIN firms ON firms.id = shipments.to_firm_id
  LEFT JOIN firms AS carriers ON carriers.id = shipments.carrier_id
  LEFT JOIN people ON people.id = shipments.dispatched_by
  LEFT JOIN shipment_lines AS line ON line.shipment_id = shipments.id
  LEFT JOIN cylinders ON cylinders.id = line.cylinder_id`

/** The shipments, the newest first. Errors: 400 for a cursor that is none of ours. */
export async function listShipments(db: Database, query: ShipmentsQuery): Promise<ShipmentsAnswer> {
  const filter = pageFilter('shipment', query, STATE)
  const { rows } = await db.readClient.execute({
    sql: `${SELECT_SHIPMENTS} WHERE ${filter.sql} GROUP BY shipments.id ORDER BY shipments.number DESC LIMIT ?`,
    args: [...filter.args, query.limit + 1],
  })
  return pageByNumber(rows.map(shipmentOf), query.limit)
}

/** One shipment. Errors: 404. */
export async function theShipment(db: Database, id: string): Promise<Shipment> {
  const { rows } = await db.readClient.execute({ sql: `${SELECT_SHIPMENTS} WHERE shipments.id = ? GROUP BY shipments.id`, args: [id] })
  if (!rows[0]) throw problem(404, 'No such shipment', 'It may have been written wrongly.')
  return shipmentOf(rows[0])
}

function shipmentOf(row: Row): Shipment {
  return {
    id: row['id'] as string,
    number: row['number'] as number,
    to: { id: row['to_firm_id'] as string, name: row['to_name'] as string },
    state: row['state'] as Shipment['state'],
    note: row['note'] as string | null,
    carrier: row['has_carrier'] === 1 ? { id: row['carrier_id'] as string | null, name: row['carrier_name'] as string | null ?? 'our own vehicle' } : null,
    createdAt: instantText(row['created_at'])!,
    readyAt: instantText(row['ready_at']),
    dispatchedAt: instantText(row['dispatched_at']),
    dispatchedBy: row['dispatched_by_name'] as string | null,
    arrivedAt: instantText(row['arrived_at']),
    settledAt: instantText(row['settled_at']),
    closedAt: instantText(row['closed_at']),
    cancelledAt: instantText(row['cancelled_at']),
    cylinders: row['line_count'] as number,
    netGrams: row['net_grams'] as number | null,
  }
}
