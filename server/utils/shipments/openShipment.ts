import type { ShipmentStep } from '~~/utils/shipment/steps'
import type { Shipment } from '~~/utils/contract/shipments'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { refuseStep } from './refuseStep'
import { theShipment } from './shipments'

/** A shipment on whose state a step may follow. Errors: 404; 409 where it may not. */
export async function shipmentFor(db: Database, id: string, step: Exclude<ShipmentStep, 'ready' | 'dispatch'>): Promise<Shipment> {
  const shipment = await theShipment(db, id)
  refuseStep(step, { state: shipment.state, hasCarrier: shipment.carrier !== null, lines: [], papersLack: [] })
  return shipment
}

/** Errors: 404; 409 where it has left, or was given up. */
export async function refuseUnlessOpen(db: Database, id: string): Promise<void> {
  await shipmentFor(db, id, 'change')
}

/** Holds while a shipment has not left. */
export function isOpen(shipmentId: string): Guard {
  return { sql: `EXISTS (SELECT 1 FROM shipments WHERE id = ? AND state IN ('draft', 'ready'))`, args: [shipmentId] }
}
