import { z } from 'zod'
import type { Named } from '../custody/cylinderView'
import { condition, refrigerant } from '../custody/schema/parts'
import { isDay, type Day } from '../quantity/day'
import type { DatedPrice } from '../reclaim/price'
import type { ReclaimerTerms } from '../reclaim/terms'
import type { WorthOffer } from '../reclaim/worth'
import { SPECS } from '../requalification/specs'
import { eachOnce, id, line, massReading } from './parts'

const MOST_REFRIGERANTS = 200
/** Ten thousand of the currency for a pound or a kilogram: no refrigerant costs so much, so that more is a slip. Our own bound. */
const MOST_MILLS = 10_000_000
const MOST_CENTS = 100_000_000

const day = z.string('must be a day such as 2026-03-31')
  .regex(/^(19|20|21)\d{2}-\d{2}-\d{2}$/, 'must be a day such as 2026-03-31').refine(isDay, 'must be a day that the calendar has')

const takenRefrigerant = z.strictObject({
  designation: refrigerant,
  // Mixed contents are a term of their own.
  conditions: z.array(condition.exclude(['mixed'])).min(1, 'must name a condition').max(4).refine(eachOnce, 'must name each condition once'),
})

/** What a reclaimer takes; the same as {@link ReclaimerTerms}. */
const terms = z.strictObject({
  refrigerants: z.array(takenRefrigerant).max(MOST_REFRIGERANTS)
    .refine(list => eachOnce(list.map(({ designation }) => designation)), 'must name each refrigerant once'),
  takesMixed: z.boolean(),
  takesUnknown: z.boolean(),
  takesOverdue: z.boolean(),
  specs: z.array(z.enum(Object.keys(SPECS), 'must be a specification such as DOT-4BA')).min(1, 'must name a specification, or be null for any').max(40)
    .refine(eachOnce, 'must name each specification once').nullable(),
  pressuresPsig: z.array(z.number().int().positive().max(10_000)).min(1, 'must name a pressure, or be null for any').max(20)
    .refine(list => new Set(list).size === list.length, 'must name each pressure once').nullable(),
  mostContaminationPercent: z.number().nonnegative().max(100, 'must be at most 100 %').nullable(),
  minimum: massReading.nullable(),
  minimumCylinders: z.number().int().positive().max(10_000).nullable(),
  pickUpCents: z.number().int().nonnegative().max(MOST_CENTS).nullable(),
  note: line(500).nullable(),
}) satisfies z.ZodType<ReclaimerTerms>

/** POST /api/firms/{id}/terms: what a reclaimer takes from a day on; with an id of the sender's own it may be sent twice. */
export const termsBody = z.strictObject({ id: id.optional(), fromDay: day, terms })

/** POST /api/firms/{id}/prices: what a reclaimer pays for a refrigerant in a condition; negative is charged. */
export const priceBody = z.strictObject({
  id: id.optional(),
  refrigerant: refrigerant.nullable(),
  condition,
  fromDay: day,
  untilDay: day.nullish(),
  mills: z.number().int('must be whole thousandths').min(-MOST_MILLS, 'must be at most 10,000 for each unit').max(MOST_MILLS, 'must be at most 10,000 for each unit'),
  per: z.enum(['lb', 'kg']),
})
  .refine(({ fromDay, untilDay }) => !untilDay || untilDay >= fromDay, { path: ['untilDay'], message: 'must not be before its first day' })
  .refine(({ refrigerant: named, condition: state }) => named !== null || state !== 'clean', { path: ['condition'], message: 'cannot be clean where no refrigerant is named' })

/** Terms or a price of a firm: POST /api/firms/{id}/terms/{rowId}/withdraw, and the same for prices. */
export const firmRowParams = z.strictObject({ id, rowId: id })

export type NewTerms = z.output<typeof termsBody>
export type NewPrice = z.output<typeof priceBody>

/** Who recorded a row and when (ISO 8601, and the day in the firm's time zone), and who withdrew it. */
export interface RecordedRow { recordedBy: Named, recordedAt: string, recordedOn: Day, withdrawn: { by: Named, on: Day } | null, mayWithdraw: boolean }

/** Terms as they were recorded. */
export interface TermsRow extends RecordedRow { id: string, fromDay: Day, terms: ReclaimerTerms }

/** A price as it was recorded. */
export interface PriceRow extends RecordedRow { price: DatedPrice }

/** GET /api/firms/{id}/terms: every row, the latest first; `today` in the firm's time zone. */
export interface TermsAnswer { today: Day, items: TermsRow[] }

/** GET /api/firms/{id}/prices: every row, by refrigerant and condition, the latest first. */
export interface PricesAnswer { today: Day, items: PriceRow[] }

/** Stock that stands where no truck fetches it: on a van, at a site, or nobody knows where. */
export interface StockElsewhere { place: Named | null, cylinders: number, netGrams: number }

/** GET /api/reclaim/worth: what each reclaimer would take today of what is in stock and on no list. */
export interface WorthAnswer {
  today: Day
  /** Those in use; null terms where what one takes today is not recorded. */
  reclaimers: { id: string, name: string, terms: ReclaimerTerms | null }[]
  /** Shops, each with its racks. */
  places: Named[]
  /** Customers whose refrigerant is among it. */
  owners: Named[]
  offers: WorthOffer[]
  elsewhere: StockElsewhere[]
  /** Cylinders with contents in stock and on no list that were looked at. */
  stock: number
  /** Whether these are all of them; in a very large fleet only the heaviest are looked at. */
  isAll: boolean
}
