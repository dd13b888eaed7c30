import { z } from 'zod'
import { readingGrams } from '../quantity/mass'
import type { Named } from '../custody/cylinderView'
import { id, massInQuery } from './parts'

/** GET /api/cylinder-ranking: which cylinder takes how much of what, from a van or from the asker's own one. */
export const rankingQuery = z.strictObject({
  refrigerant: z.string().min(1).max(40),
  amount: massInQuery.refine(reading => readingGrams(reading) > 0, 'must be more than nothing'),
  van: id.optional(),
})
export type RankingQuery = z.output<typeof rankingQuery>

/** How near a cylinder is to who asks: on the van, otherwise in their hands, in a shop. */
export const REACHES = ['van', 'held', 'shop'] as const
export type Reach = (typeof REACHES)[number]

/** Whether all of it goes in, a part, none until it is weighed, or nothing may go in. */
export const FITS = ['whole', 'part', 'not-weighed', 'refused'] as const
export type Fit = (typeof FITS)[number]

/** A cylinder in the order of choice. */
export interface RankedLine {
  id: string
  labelCode: string | null
  serial: string | null
  place: Named | null
  holder: Named | null
  reach: Reach
  fit: Fit
  /** null where it is not weighed and where nothing may go in. */
  roomGrams: number | null
  /** Unrounded; null where nothing may go in. */
  exactStopWeightGrams: number | null
  /** In words, the weightiest first. */
  reasons: string[]
}

export interface RankingAnswer {
  refrigerant: string
  amountGrams: number
  van: Named | null
  items: RankedLine[]
  /** Two that take together what no single one does, and how much goes into each; null where one suffices or no two do. */
  pair: { id: string, grams: number }[] | null
  /** Cylinders in the shops that were too many to compare. */
  leftOut: number
}
