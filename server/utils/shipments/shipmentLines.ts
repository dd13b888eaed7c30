import type { ShipmentLine } from '~~/utils/contract/shipments'
import type { Database } from '../database/database'

/** The lines as stored, in their order. */
export async function shipmentLines(db: Database, shipmentId: string): Promise<{ cylinderId: string, sent: ShipmentLine['sent'] }[]> {
  const { rows } = await db.readClient.execute({
    sql: 'SELECT cylinder_id, sent FROM shipment_lines WHERE shipment_id = ? ORDER BY position', args: [shipmentId],
  })
  return rows.map(row => ({ cylinderId: row[0] as string, sent: row[1] === null ? null : JSON.parse(row[1] as string) as ShipmentLine['sent'] }))
}
