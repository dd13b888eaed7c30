import { z } from 'zod'
import type { CylinderRow } from '../custody/cylinderView'
import type { Finding } from '../custody/finding'
import type { MassReading } from '../quantity/mass'
import { eachOnce, id, line, massReading, page, type Page } from './parts'

const cylinderIds = z.array(id).max(200).refine(ids => eachOnce(ids), 'must name each cylinder once')

/** POST /api/shipments: a draft. */
export const shipmentBody = z.strictObject({ id: id.optional(), toFirmId: id, cylinderIds: cylinderIds.default([]), note: line(500).nullish() })
/** PUT /api/shipments/{id}/lines: the whole list of a draft. */
export const shipmentLinesBody = z.strictObject({ cylinderIds })

/** POST /api/shipments/{id}/dispatch: each line weighed; everything leaves in one commit or nothing does. */
export const dispatchBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  lines: z.array(z.strictObject({ cylinderId: id, eventId: id, expects: z.number().int().nonnegative(), gross: massReading })).min(1).max(200)
    .refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
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
  })).min(1).max(200).refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
})

const SHIPMENT_STATES = ['draft', 'ready', 'dispatched', 'arrived', 'settled', 'closed', 'cancelled'] as const
export type ShipmentState = (typeof SHIPMENT_STATES)[number]

/** GET /api/shipments: the newest first. */
export const shipmentsQuery = z.strictObject({ ...page, state: z.enum(SHIPMENT_STATES).optional() })

export type NewShipment = z.output<typeof shipmentBody>
export type ShipmentDispatch = z.output<typeof dispatchBody>
export type ShipmentReceipt = z.output<typeof receiptBody>
export type ShipmentsQuery = z.output<typeof shipmentsQuery>
export type ShipmentsAnswer = Page<Shipment>

/** What the log says now of a cylinder as it left; null where it has not left at all, as a correction has it. */
export interface PaperDifference { logged: { refrigerant: string | null, condition: string, netGrams: number | null } | null }

export interface ShipmentLine {
  cylinder: CylinderRow
  version: number
  /** Why it may not leave; empty when it may. */
  because: Finding[]
  /** As it left. */
  sent: { gross: MassReading, grossGrams: number, refrigerant: string | null, condition: string, netGrams: number | null } | null
  /** What the log says now of the cylinder as it left, where late entries or corrections made it say something else than the papers; left out where it says the same. */
  differs?: PaperDifference
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
  readyAt: string | null
  arrivedAt: string | null
  settledAt: string | null
  closedAt: string | null
  cancelledAt: string | null
  cylinders: number
  /** Of known nets; null when none is known. */
  netGrams: number | null
}

export interface ShipmentWithLines extends Shipment { lines: ShipmentLine[] }
