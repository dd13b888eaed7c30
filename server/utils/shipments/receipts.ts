import type { ShipmentLine } from '~~/utils/contract/shipments'
import { readingGrams } from '~~/utils/quantity/mass'
import type { Database } from '../database/database'
import { reclaimedEvents } from '../settlement/reclaimedEvents'

/** What the reclaimer found on each line of a shipment, by cylinder, as corrections have left it. */
export async function receiptsOf(db: Database, shipmentId: string): Promise<Map<string, NonNullable<ShipmentLine['received']>>> {
  return new Map([...await reclaimedEvents(db, shipmentId)].map(([cylinderId, { details: { theirGross, acceptedNet, grade, price, pricePer } }]) => [cylinderId, {
    theirGrossGrams: theirGross ? readingGrams(theirGross) : null,
    acceptedNetGrams: acceptedNet ? readingGrams(acceptedNet) : null,
    grade: grade ?? null,
    price: price ?? null,
    pricePer: pricePer ?? null,
  }]))
}
