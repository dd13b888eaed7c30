import type { ShipmentLine, ShipmentWithLines } from '../../utils/contract/shipments'
import { cylinderRow } from './cylinderRow'

/** A line of a shipment: 22.6 lb of R-410A in a cylinder of 27.5 lb, not weighed yet. */
export function shipmentLine(id: string, labelCode: string, change: Partial<ShipmentLine> = {}): ShipmentLine {
  return { cylinder: cylinderRow({ id, labelCode }), version: 3, because: [], weighed: null, sent: null, received: null, returnedAt: null, ...change }
}

/** What the scale showed of a line of ours, kept by the warehouse. */
export function weighed(value: number, change: Partial<NonNullable<ShipmentLine['weighed']>> = {}): NonNullable<ShipmentLine['weighed']> {
  return { gross: { unit: 'lb', value }, grossGrams: Math.round(value * 453.59237), netGrams: null, at: '2026-05-01T10:05:00.000Z', by: 'Wes', isStale: false, ...change }
}

/** A shipment to a reclaimer, a draft that our own vehicle carries. */
export function shipmentOf(lines: ShipmentLine[], change: Partial<ShipmentWithLines> = {}): ShipmentWithLines {
  return {
    id: '01900000-0000-7000-8000-0000000000f1', number: 4, state: 'draft', to: { id: 'f', name: 'Reclaimer One' }, note: null,
    carrier: { id: null, name: 'our own vehicle' }, cylinders: lines.length, netGrams: null,
    createdAt: '2026-05-01T10:00:00.000Z', readyAt: null, dispatchedAt: null, dispatchedBy: null, arrivedAt: null, settledAt: null, closedAt: null, cancelledAt: null,
    lines, papersLack: [], isUnasked: false, ...change,
  }
}
