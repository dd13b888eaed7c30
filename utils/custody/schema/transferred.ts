import { z } from 'zod'
import { condition, mass, refrigerant, uuid } from './parts'

/** One cylinder's half of a transfer between two. A refrigerant of null is one that nobody knows. */
export const details = z.strictObject({
  direction: z.enum(['out', 'in'], 'must be out or in'),
  /** The other cylinder. */
  counterpartId: uuid,
  /** Both halves carry it. */
  transferId: uuid,
  refrigerant: refrigerant.nullable(),
  condition,
  ownerOfRefrigerantId: uuid.optional(),
  /** Whose cylinder it goes into agrees that it is filled. */
  ownerConsents: z.literal(true, 'is either true or left out').optional(),
  grossBefore: mass.optional(),
  grossAfter: mass,
})
