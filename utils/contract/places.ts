import { z } from 'zod'
import { id, line } from './parts'

export const PLACE_KINDS = ['shop', 'rack', 'van', 'site', 'firm'] as const
export const FIRM_KINDS = ['reclaimer', 'requalifier', 'supplier', 'customer', 'carrier'] as const

/** POST /api/places. A firm's own place is made with the firm. */
export const placeBody = z.strictObject({
  id: id.optional(),
  name: line(80),
  kind: z.enum(['shop', 'rack', 'van', 'site']),
  parentId: id.nullish(),
  technicianId: id.nullish(),
})
/** PATCH /api/places/{id}. */
export const placeChange = z.strictObject({
  name: line(80).optional(),
  parentId: id.nullish(),
  technicianId: id.nullish(),
  active: z.boolean().optional(),
})

export interface Place {
  id: string
  name: string
  kind: (typeof PLACE_KINDS)[number]
  parentId: string | null
  firmId: string | null
  technicianId: string | null
  technicianName: string | null
  active: boolean
  /** Cylinders there now. */
  cylinders: number
}

/** POST /api/firms: makes the firm and its place. */
export const firmBody = z.strictObject({
  id: id.optional(),
  name: line(120),
  kind: z.enum(FIRM_KINDS),
  telephone: line(40).nullish(),
  email: z.email().max(200).nullish(),
  address: line(300).nullish(),
  rin: z.string().regex(/^[A-Z]\d{3}$/, 'a RIN is a letter and three digits').nullish(),
})
/** PATCH /api/firms/{id}. */
export const firmChange = firmBody.omit({ id: true, kind: true }).partial().extend({ active: z.boolean().optional() })

export interface Firm {
  id: string
  name: string
  kind: (typeof FIRM_KINDS)[number]
  telephone: string | null
  email: string | null
  address: string | null
  rin: string | null
  placeId: string
  active: boolean
}
