import type { DockAnswer, DockCylinder } from '../../../utils/contract/dock'
import type { ShipmentState } from '../../../utils/contract/shipments'
import { dockLines } from '../../../utils/dock/dockLines'
import { cylinderRows } from '../custody/fleet'
import type { Database } from '../database/database'
import { ownFirm } from '../firm'
import { shipmentLines } from '../shipments/shipmentLines'
import { theShipment } from '../shipments/shipments'
import { dockEntries } from './linkEntries'
import type { DockLinkRow } from './openedLink'

/** While it is in one of these, the dock is shown its cylinders. */
const SHOWN: ReadonlySet<ShipmentState> = new Set(['dispatched', 'arrived', 'settled', 'closed'])

/** Why no entry is taken for a shipment; null while they are. */
export function closedBecause(state: ShipmentState): string | null {
  switch (state) {
    case 'dispatched':
    case 'arrived': return null
    case 'settled':
    case 'closed': return 'This shipment is settled. Nothing more is taken down here; speak to the sender.'
    case 'cancelled': return 'This shipment was given up by its sender.'
    default: return 'This shipment has not left yet.'
  }
}

/** The one shipment that a link opens, as the dock may see it: our weight of a cylinder only once theirs is entered. */
export async function dockAnswer(db: Database, link: DockLinkRow, now: number): Promise<DockAnswer> {
  const [shipment, firm, stored, entries] = await Promise.all([
    theShipment(db, link.shipmentId), ownFirm(), shipmentLines(db, link.shipmentId), dockEntries(db, link.shipmentId),
  ])
  const shown = SHOWN.has(shipment.state) ? stored : []
  const [rows, said] = [await cylinderRows(db, shown.map(line => line.cylinderId), now), dockLines(entries)]
  return {
    shipment: { id: shipment.id, number: shipment.number, state: shipment.state },
    closed: closedBecause(shipment.state),
    from: { name: firm.name, telephone: firm.telephone },
    to: { name: shipment.to.name },
    link: { id: link.id, forWhom: link.forWhom, expiresAt: new Date(link.expiresAt).toISOString() },
    unit: firm.units,
    cylinders: shown.flatMap(({ cylinderId, sent }): DockCylinder[] => {
      const row = rows.get(cylinderId)?.row
      if (!row || !sent) return []
      return [{
        cylinderId, serial: row.serial, labelCode: row.labelCode, specification: row.spec,
        refrigerant: sent.refrigerant, condition: sent.condition,
        ourGross: said.get(cylinderId)?.theirGross ? sent.gross : null,
      }]
    }),
    entries,
  }
}
