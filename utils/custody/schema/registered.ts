import { z } from 'zod'
import { condition, mark, mass, refrigerant, stamp, uuid } from './parts'

/** A cylinder enters the log with what its collar says. Contents left out are unknown. */
export const details = z.strictObject({
  stamp,
  marks: z.array(mark).max(60, 'must be at most 60 marks').optional(),
  ownership: z.enum(['own', 'rental', 'deposit', 'customer'], 'must be own, rental, deposit or customer'),
  ownerId: uuid.optional(),
  dedicatedTo: refrigerant.optional(),
  contents: z.union([
    z.literal('evacuated'), z.literal('unknown'), z.strictObject({ refrigerant, condition }),
  ], 'must be "evacuated", "unknown" or { refrigerant, condition }').optional(),
  gross: mass.optional(),
})
