import { z } from 'zod'
import { RIN } from '../requalification/struckMark'
import { id, line, printedLine, type Page } from './parts'

/** What a firm is to the contractor. */
const FIRM_KINDS = ['reclaimer', 'requalifier', 'supplier', 'customer', 'carrier'] as const

/** POST /api/places. A firm's own place is made with the firm. */
export const placeBody = z.strictObject({
  id: id.optional(),
  name: line(80),
  kind: z.enum(['shop', 'rack', 'van', 'site']),
  parentId: id.nullish(),
  technicianId: id.nullish(),
})
export type NewPlace = z.output<typeof placeBody>
/** PATCH /api/places/{id}. 409 for closing a place where cylinders stand or that has one in use inside it, and for a firm's own place. */
export const placeChange = z.strictObject({
  name: line(80).optional(),
  parentId: id.nullish(),
  technicianId: id.nullish(),
  active: z.boolean().optional(),
})
export type PlaceChange = z.output<typeof placeChange>

/** GET /api/places?active=true|false and GET /api/firms?active=&kind= : the whole list, by name. */
export const placesQuery = z.strictObject({ active: z.enum(['true', 'false']).optional() })
export const firmsQuery = z.strictObject({ active: z.enum(['true', 'false']).optional(), kind: z.enum(FIRM_KINDS).optional() })

export type PlacesAnswer = Page<Place>

/** What stands in one place itself, without what stands in the places inside it. */
export interface Standing {
  placeId: string
  cylinders: number
  /** Of the cylinders whose gross is known. */
  grossGrams: number
  withoutWeight: number
  /** By refrigerant; 'none' where nothing is in a cylinder, null where it is not known what is. */
  refrigerants: { refrigerant: string | null, cylinders: number }[]
}
/** GET /api/places/standing: every place in which cylinders stand. */
export interface StandingAnswer { items: Standing[] }
export type FirmsAnswer = Page<Firm>

/** A place as it is read. */
export interface Place {
  id: string
  name: string
  kind: 'shop' | 'rack' | 'van' | 'site' | 'firm'
  parentId: string | null
  firmId: string | null
  technicianId: string | null
  technicianName: string | null
  active: boolean
  /** Cylinders there now. */
  cylinders: number
}

/** POST /api/firms: makes the firm and its place. A RIN belongs to a requalifier. */
export const firmBody = z.strictObject({
  id: id.optional(),
  name: printedLine(120),
  kind: z.enum(FIRM_KINDS),
  telephone: printedLine(40).nullish(),
  email: z.email().max(200).nullish(),
  address: printedLine(300).nullish(),
  rin: z.string().regex(RIN, 'a RIN has four letters or figures').nullish(),
})
/** PATCH /api/firms/{id}. */
export const firmChange = firmBody.omit({ id: true, kind: true }).partial().extend({ active: z.boolean().optional() })
export type NewFirm = z.output<typeof firmBody>
export type FirmChange = z.output<typeof firmChange>

/** A firm as it is read. */
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
  /** Cylinders there now. */
  cylinders: number
}
