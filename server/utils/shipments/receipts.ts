import type { ShipmentLine } from '~~/utils/contract/shipments'
import { readingGrams } from '~~/utils/quantity/mass'
import { lineEvents } from '../cylinder-lists/lineEvents'
import type { Database } from '../database/database'

/** What the reclaimer found on each line of a shipment, by cylinder, as corrections have left it. */
export async function receiptsOf(db: Database, shipmentId: string): Promise<Map<string, NonNullable<ShipmentLine['received']>>> {
  const events = await lineEvents(db, { kind: 'shipment', id: shipmentId }, ['reclaimed'])
  const receipts = new Map<string, NonNullable<ShipmentLine['received']>>()
  for (const event of [...events.values()].flat()) {
    if (event.kind !== 'reclaimed' || event.details.shipmentId !== shipmentId) continue
    const { theirGross, acceptedNet, grade, price } = event.details
    receipts.set(event.cylinderId, {
      theirGrossGrams: theirGross ? readingGrams(theirGross) : null,
      acceptedNetGrams: acceptedNet ? readingGrams(acceptedNet) : null,
      grade: grade ?? null,
      price: price ?? null,
    })
  }
  return receipts
}
