import { z } from 'zod'
import { MOST_READINGS } from '../../recovery/mostReadings'
import { MOST_READ } from '../../recovery/reachedDraft'
import { condition, instant, line, mass, refrigerant, uuid, vacuum } from './parts'

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
  readings: z.array(z.strictObject({ at: instant, gross: mass })).max(MOST_READINGS, `must be at most ${MOST_READINGS} readings`).optional(),
  /** Whose cylinder it is agrees that it is filled. */
  ownerConsents: z.literal(true, 'is either true or left out').optional(),
  /** Air was let out of hoses and lines before. */
  purged: z.literal(true, 'is either true or left out').optional(),
  /** What the system was brought down to, and how long it held there. */
  reached: z.strictObject({
    vacuum,
    heldMinutes: z.number('must be a number').nonnegative('must not be negative').max(MOST_READ.heldMinutes, `must be at most ${MOST_READ.heldMinutes} minutes`).optional(),
  }).optional(),
})
