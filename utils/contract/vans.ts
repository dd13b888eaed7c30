import { z } from 'zod'
import { readingGrams, type MassReading } from '../quantity/mass'
import type { CylinderRow, Named } from '../custody/cylinderView'
import { id, line, massReading } from './parts'
import type { Place } from './places'

/** Most cylinders that one check-in names of a kind: all that may by mistake stand in a van are still checked. */
const MOST_ABOARD = 5_000

/** POST /api/vans/{id}/materials: what it carries beside cylinders, all together. With an id of the sender's own it may be sent twice. */
export const vanMaterialsBody = z.strictObject({
  id,
  gross: massReading.refine(reading => readingGrams(reading) <= 50_000_000, 'must be at most 50,000 kg'),
  note: line(200).or(z.literal('')).default(''),
})
export type NewVanMaterials = z.output<typeof vanMaterialsBody>

/** POST /api/vans/{id}/check-ins: what was found aboard and what was not. With an id of the sender's own it may be sent twice. */
export const vanCheckInBody = z.strictObject({
  id,
  found: z.array(id).max(MOST_ABOARD),
  missing: z.array(id).max(MOST_ABOARD),
}).refine(({ found, missing }) => !missing.some(each => found.includes(each)), 'a cylinder is found or missing, not both')
export type NewVanCheckIn = z.output<typeof vanCheckInBody>

/** What a van carries beside cylinders, as it was last said. */
export interface VanMaterials { gross: MassReading, grams: number, note: string, saidBy: Named, saidAt: string }

/** A cylinder that the last check-in of its van did not find, and that nobody has seen since. */
export interface ToLookFor { cylinder: CylinderRow, checkedBy: Named, checkedAt: string }

/** What GET /api/vans/{id} answers. */
export interface VanAnswer {
  van: Place
  aboard: CylinderRow[]
  /** Held by the van's technician and standing elsewhere by the log. */
  heldElsewhere: CylinderRow[]
  /** null where nobody has said. */
  materials: VanMaterials | null
  toLookFor: ToLookFor[]
  lastCheckIn: { checkedBy: Named, checkedAt: string } | null
}

/** One van in the list of GET /api/vans. */
export interface VanSummary {
  van: Place
  aboard: Pick<CylinderRow, 'tareWeightGrams' | 'netGrams'>[]
  materials: VanMaterials | null
  toLookFor: ToLookFor[]
}
/** What GET /api/vans answers. */
export interface VansAnswer { items: VanSummary[] }
