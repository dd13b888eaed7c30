import type { ShipmentLine } from '~~/utils/contract/shipments'
import type { DetailsOf } from '~~/utils/custody/schema'
import { readingGrams } from '~~/utils/quantity/mass'
import { logRow, recordedEvent, SELECT_LOG } from '../custody/logRow'
import type { Database } from '../database/database'

/** What the reclaimer found on each line of a shipment, by cylinder, as it was recorded. */
export async function receiptsOf(db: Database, shipmentId: string): Promise<Map<string, NonNullable<ShipmentLine['received']>>> {
  const { rows } = await db.readClient.execute({
    sql: `${SELECT_LOG} WHERE kind = 'reclaimed' AND cylinder_id IN (SELECT cylinder_id FROM shipment_lines WHERE shipment_id = ?)
      AND lower(json_extract(body, '$.details.shipmentId')) = ? ORDER BY seq`,
    args: [shipmentId, shipmentId],
  })
  return new Map(rows.map((row) => {
    const { cylinderId, details } = recordedEvent(logRow(row))
    const { theirGross, acceptedNet, grade, price } = details as DetailsOf<'reclaimed'>
    return [cylinderId, {
      theirGrossGrams: theirGross ? readingGrams(theirGross) : null,
      acceptedNetGrams: acceptedNet ? readingGrams(acceptedNet) : null,
      grade: grade ?? null,
      price: price ?? null,
    }]
  }))
}
