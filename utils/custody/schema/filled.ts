import { z } from 'zod'
import { condition, instant, line, mass, refrigerant, uuid } from './parts'

/** Refrigerant is recovered into a cylinder. A refrigerant of null is one that nobody knows. */
export const details = z.strictObject({
  refrigerant: refrigerant.nullable(),
  condition: condition.optional(),
  grossBefore: mass.optional(),
  grossAfter: mass,
  method: line(40).optional(),
  jobId: uuid.optional(),
  ownerOfRefrigerantId: uuid.optional(),
  scaleId: uuid.optional(),
  /** The outside of the cylinder was looked at first. */
  looked: z.literal(true, 'is either true or left out').optional(),
  /** What the scale showed on the way, hoses on. */
  readings: z.array(z.strictObject({ at: instant, gross: mass })).max(200, 'must be at most 200 readings').optional(),
})
