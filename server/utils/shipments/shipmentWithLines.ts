import type { Access } from '~~/utils/access/roles'
import type { PaperDifference, ShipmentLine, ShipmentWithLines } from '~~/utils/contract/shipments'
import { mayShip } from '~~/utils/custody/plan'
import { cylinderViews } from '../custody/cylinderViews'
import { cylinderRows } from '../custody/fleet'
import type { Database } from '../database/database'
import { paperDifferences } from './paperDifferences'
import { receiptsOf } from './receipts'
import { shipmentLines } from './shipmentLines'
import { theShipment } from './shipments'

/** A shipment with its lines: while a draft each with why it may not leave, afterwards each as it left. Errors: 404. */
export async function shipmentWithLines(db: Database, id: string, access: Access, nowMs: number): Promise<ShipmentWithLines> {
  const [shipment, stored] = await Promise.all([theShipment(db, id), shipmentLines(db, id)])
  const ids = stored.map(line => line.cylinderId)
  const [rows, views, receipts] = await Promise.all([
    cylinderRows(db, ids, nowMs),
    shipment.dispatchedAt === null ? cylinderViews(db, ids, { access, nowMs }) : [],
    receiptsOf(db, id),
  ])
  const differing = shipment.dispatchedAt !== null ? await paperDifferences(db, id, stored) : new Map<string, PaperDifference>()
  const because = new Map(views.map(view => [view.id, mayShip(view).because]))
  const lines = stored.flatMap(({ cylinderId, sent }): ShipmentLine[] => {
    const found = rows.get(cylinderId)
    if (!found) return []
    return [{
      cylinder: found.row,
      version: found.version,
      because: because.get(cylinderId) ?? [],
      sent,
      ...differing.has(cylinderId) && { differs: differing.get(cylinderId) },
      received: receipts.get(cylinderId) ?? null,
    }]
  })
  return { ...shipment, lines }
}
