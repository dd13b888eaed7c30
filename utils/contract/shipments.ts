import { z } from 'zod'
import type { CylinderRow } from '../custody/cylinderView'
import type { Finding } from '../custody/finding'
import type { MassReading } from '../quantity/mass'
import { eachOnce, grossReading, id, line, page, type Page } from './parts'

const cylinderIds = z.array(id).max(200).refine(ids => eachOnce(ids), 'must name each cylinder once')

/** POST /api/shipments: a draft. */
export const shipmentBody = z.strictObject({ id: id.optional(), toFirmId: id, cylinderIds: cylinderIds.default([]), note: line(500).nullish() })

/** What every act of ours says of itself: under its id it is kept once, however often it is sent. */
const act = { id, occurredAt: z.iso.datetime({ offset: true }) }
/** Why something was done, in a person's words. */
const reason = line(200)

/** PATCH /api/shipments/{id}/lines: cylinders onto the list of a shipment that has not left, and off it with a reason. */
export const shipmentLinesBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  add: z.array(z.strictObject({ id, cylinderId: id })).max(200).default([]),
  takeOff: z.array(z.strictObject({ id, cylinderId: id, reason })).max(200).default([]),
}).refine(({ add, takeOff }) => eachOnce([...add, ...takeOff].map(one => one.cylinderId)), 'must name each cylinder once')
  // Two under one id would be kept as one, and the second cylinder come onto the list without a word in its history.
  .refine(({ add, takeOff }) => eachOnce([...add, ...takeOff].map(one => one.id)), 'must have an id for each')

/** POST /api/shipments/{id}/weighings: one of its cylinders as it was scanned, or its serial as it was read, and what the scale shows. */
export const weighingBody = z.strictObject({ ...act, ref: line(80), gross: grossReading })

/** POST /api/shipments/{id}/carrier: who carries it; null for our own vehicle. */
export const carrierBody = z.strictObject({ ...act, carrierId: id.nullable() })

/** POST /api/shipments/{id}/ready, and /arrival. */
export const actBody = z.strictObject(act)

/** POST /api/shipments/{id}/cancel. */
export const cancelBody = z.strictObject({ ...act, reason })

/** POST /api/shipments/{id}/returns: cylinders of it that came back, each weighed. */
export const returnsBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  placeId: id,
  reason,
  lines: z.array(z.strictObject({ cylinderId: id, eventId: id, gross: grossReading })).min(1).max(200)
    .refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
})

/** POST /api/shipments/{id}/dispatch: each line at the weight it was made ready with; everything leaves in one commit or nothing does. */
export const dispatchBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  lines: z.array(z.strictObject({ cylinderId: id, eventId: id, expects: z.number().int().nonnegative(), gross: grossReading })).min(1).max(200)
    .refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
})

export const SHIPMENT_STATES = ['draft', 'ready', 'dispatched', 'arrived', 'settled', 'closed', 'cancelled'] as const
export type ShipmentState = (typeof SHIPMENT_STATES)[number]

/** GET /api/shipments: the newest first. */
export const shipmentsQuery = z.strictObject({ ...page, state: z.enum(SHIPMENT_STATES).optional() })

export type NewShipment = z.output<typeof shipmentBody>
export type LineChanges = z.output<typeof shipmentLinesBody>
export type Weighing = z.output<typeof weighingBody>
export type CarrierChoice = z.output<typeof carrierBody>
export type OwnAct = z.output<typeof actBody>
export type Cancelling = z.output<typeof cancelBody>
export type ShipmentReturns = z.output<typeof returnsBody>
export type ShipmentDispatch = z.output<typeof dispatchBody>
export type ShipmentsQuery = z.output<typeof shipmentsQuery>
export type ShipmentsAnswer = Page<Shipment>

/** What the log says now of a cylinder as it left; null where it has not left at all, as a correction has it. */
export interface PaperDifference { logged: { refrigerant: string | null, condition: string, netGrams: number | null } | null }

/** What the scale showed of a line that is prepared. */
export interface LineWeighing {
  gross: MassReading
  grossGrams: number
  /** Gross less tare; null where the tare is not known. */
  netGrams: number | null
  at: string
  by: string | null
  /** Something was recorded of the cylinder since: it is weighed again. */
  isStale: boolean
}

export interface ShipmentLine {
  cylinder: CylinderRow
  version: number
  /** Why it may not leave, judged with its weighing where there is one; empty when it may. */
  because: Finding[]
  /** As it was scanned and weighed for the papers; null until then. */
  weighed: LineWeighing | null
  /** As it left. */
  sent: { gross: MassReading, grossGrams: number, refrigerant: string | null, condition: string, netGrams: number | null } | null
  /** What the log says now of the cylinder as it left, where late entries or corrections made it say something else than the papers; left out where it says the same. */
  differs?: PaperDifference
  /** Of the `reclaimed` event. */
  received: { theirGrossGrams: number | null, acceptedNetGrams: number | null, grade: string | null, price: number | null, pricePer: 'lb' | 'kg' | null } | null
  /** When it came back before it was settled; null where it did not. */
  returnedAt: string | null
}

export interface Shipment {
  id: string
  number: number
  to: { id: string, name: string }
  state: ShipmentState
  note: string | null
  /** Who carries it, our own vehicle by a null id; null where nobody has said. */
  carrier: { id: string | null, name: string } | null
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

export interface ShipmentWithLines extends Shipment {
  lines: ShipmentLine[]
  /** What its papers still lack before it may leave, a sentence each. */
  papersLack: string[]
  /** What its reclaimer takes is not recorded, so that nothing tells whether it would refuse a line. */
  isUnasked: boolean
}
