import { z } from 'zod'
import type { CylinderRow } from '../custody/cylinderView'
import type { Finding } from '../custody/finding'
import type { MassReading } from '../quantity/mass'
import { id, line, massReading } from './parts'

const cylinderIds = z.array(id).max(200)

/** POST /api/shipments: a draft. */
export const shipmentBody = z.strictObject({ id: id.optional(), toFirmId: id, cylinderIds: cylinderIds.default([]), note: line(500).nullish() })
/** PUT /api/shipments/{id}/lines: the whole list of a draft. */
export const shipmentLinesBody = z.strictObject({ cylinderIds })

/** POST /api/shipments/{id}/dispatch: each line weighed; everything leaves in one commit or nothing does. */
export const dispatchBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  lines: z.array(z.strictObject({ cylinderId: id, eventId: id, expects: z.number().int().nonnegative(), gross: massReading })).min(1).max(200),
})

/** POST /api/shipments/{id}/receipt: the reclaimer has taken it over; its figures stand beside ours. */
export const receiptBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  lines: z.array(z.strictObject({
    cylinderId: id,
    eventId: id,
    expects: z.number().int().nonnegative(),
    theirGross: massReading.optional(),
    acceptedNet: massReading.optional(),
    grade: line(80).optional(),
    price: z.number().nonnegative().finite().optional(),
  })).min(1).max(200),
})

export type ShipmentState = 'draft' | 'dispatched' | 'received' | 'cancelled'

export interface ShipmentLine {
  cylinder: CylinderRow
  version: number
  /** Why it may not leave; empty when it may. */
  because: Finding[]
  /** As it left. */
  sent: { gross: MassReading, grossGrams: number, refrigerant: string | null, condition: string, netGrams: number | null } | null
  /** Of the `reclaimed` event. */
  received: { theirGrossGrams: number | null, acceptedNetGrams: number | null, grade: string | null, price: number | null } | null
}

export interface Shipment {
  id: string
  number: number
  to: { id: string, name: string }
  state: ShipmentState
  note: string | null
  createdAt: string
  dispatchedAt: string | null
  dispatchedBy: string | null
  receivedAt: string | null
  cylinders: number
  /** Of known nets; null when none is known. */
  netGrams: number | null
}

export interface ShipmentWithLines extends Shipment { lines: ShipmentLine[] }
