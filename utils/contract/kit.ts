import { z } from 'zod'
import type { Job } from './jobs'
import { id } from './parts'
import type { PersonLine } from './people'
import type { Firm, Place } from './places'
import type { PolicyAnswer } from './policy'
import type { ScaleLine } from './scales'
import type { VanMaterials } from './vans'

const sixteen = z.string().regex(/^[0-9a-f]{16}$/, 'must be sixteen hexadecimal digits')

/**
 * GET /api/kit: what a phone keeps of the firm to work without the server. Without `since` it begins; with `since` and its
 * `mark` it goes on from there: with `after` in the first walk through the fleet, else with what was touched since.
 */
export const kitQuery = z.strictObject({
  since: z.coerce.number().int().min(0).optional(),
  mark: sixteen.optional(),
  after: id.optional(),
  /** The tag of the directory that the phone has. */
  firm: sixteen.optional(),
})
export type KitQuery = z.output<typeof kitQuery>

/** The firm as a phone needs it beside the cylinders. No e-mail addresses of its people. */
export interface KitFirm {
  /** The parts of the answer that do not change with the hour. */
  policy: Pick<PolicyAnswer, 'timeZone' | 'fillPolicies' | 'retests' | 'rules' | 'scales'>
  scales: ScaleLine[]
  places: Omit<Place, 'cylinders'>[]
  firms: Omit<Firm, 'cylinders'>[]
  people: PersonLine[]
  vans: KitVan[]
  /** The newest ones, for a fill to be tied to. */
  jobs: Job[]
}

/** What a van carries beside cylinders, and what its last check-in came to; null where nobody has said, or checked. */
export interface KitVan {
  vanId: string
  materials: VanMaterials | null
  checkIn: { missing: string[], checkedBy: string, checkedAt: string } | null
}

/** A cylinder's state in few bytes: its id as `i`, and by short names what is not as usual. */
export type PackedCylinder = Record<string, unknown> & { i: string }

/** What GET /api/kit answers. */
export interface KitAnswer {
  /** The number of the form of {@link PackedCylinder}: a phone that knows another one leaves the answer alone. */
  form: number
  /** The log could not be gone on with, or was never begun: what the phone has is to be thrown away. */
  anew: boolean
  /** How far in the custody log the phone has come once it has all of this answer. */
  seq: number
  /** Goes back with `seq`: the log is still the same up to there, and states mean the same. */
  mark: string
  cylinders: PackedCylinder[]
  /** The first walk goes on after this cylinder; null where it has ended. */
  next: string | null
  /** Further cylinders were touched since: ask on at once. */
  more: boolean
  /** Left out where the phone has it. */
  firm?: KitFirm & { tag: string }
}
