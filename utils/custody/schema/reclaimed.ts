import { z } from 'zod'
import { instant, line, mass, uuid } from './parts'

const MOST_MONEY = 1_000_000_000

/** The reclaimer has taken the contents over; its figures stand beside ours. */
export const details = z.strictObject({
  shipmentId: uuid,
  theirGross: mass.optional(),
  acceptedNet: mass.optional(),
  grade: line(80).optional(),
  /** Below zero where it was charged. */
  price: z.number('must be a number').min(-MOST_MONEY, 'must be at least -1,000,000,000').max(MOST_MONEY, 'must be at most 1,000,000,000').optional(),
  /** The unit of mass that the price is for; left out in older entries. */
  pricePer: z.enum(['lb', 'kg'], 'must be lb or kg').optional(),
  /** Who at the reclaimer's dock said so. */
  reported: z.strictObject({ linkId: uuid.optional(), name: line(80).optional(), at: instant.optional() }).optional(),
})
