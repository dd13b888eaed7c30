import type { ShipmentLine } from '~~/utils/contract/shipments'
import type { MassReading } from '~~/utils/quantity/mass'
import type { Database } from '../database/database'

/** What was read of a line as it was prepared, and of which version of its cylinder. Units: UTC milliseconds. */
export interface StoredWeighing { gross: MassReading, at: number, by: string | null, version: number }

/** A line as it is stored. */
export interface StoredLine {
  cylinderId: string
  weighed: StoredWeighing | null
  sent: ShipmentLine['sent']
  /** When it came back before it was settled; null where it did not. Units: UTC milliseconds. */
  returnedAt: number | null
}

/** The lines as stored, in their order. */
export async function shipmentLines(db: Database, shipmentId: string): Promise<StoredLine[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT line.cylinder_id, line.weighed, line.sent, people.name AS weighed_by,
        (SELECT max(act.occurred_at) FROM shipment_acts AS act
          WHERE act.shipment_id = line.shipment_id AND act.cylinder_id = line.cylinder_id AND act.kind = 'returned') AS returned_at
      FROM shipment_lines AS line LEFT JOIN people ON people.id = json_extract(line.weighed, '$.by')
      WHERE line.shipment_id = ? ORDER BY line.position`,
    args: [shipmentId],
  })
  return rows.map((row) => {
    const weighed = read<StoredWeighing>(row['weighed'])
    return {
      cylinderId: row['cylinder_id'] as string,
      weighed: weighed && { ...weighed, by: row['weighed_by'] as string | null },
      sent: read(row['sent']),
      returnedAt: row['returned_at'] as number | null,
    }
  })
}

function read<T>(json: unknown): T | null {
  return typeof json === 'string' ? JSON.parse(json) as T : null
}
