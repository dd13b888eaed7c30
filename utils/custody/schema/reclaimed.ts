import { z } from 'zod'
import { line, mass, uuid } from './parts'

/** The reclaimer has taken the contents over; its figures stand beside ours. */
export const details = z.strictObject({
  shipmentId: uuid,
  theirGross: mass.optional(),
  acceptedNet: mass.optional(),
  grade: line(80).optional(),
  price: z.number('must be a number').nonnegative('must not be negative').max(1_000_000_000, 'must be at most 1,000,000,000').optional(),
})
