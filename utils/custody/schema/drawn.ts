import { z } from 'zod'
import { mass, uuid } from './parts'

/** Refrigerant is taken out of a cylinder. */
export const details = z.strictObject({
  grossAfter: mass,
  purpose: z.enum(['same-system', 'same-owner', 'sampling', 'other'], 'must be same-system, same-owner, sampling or other'),
  jobId: uuid.optional(),
  /** Whose equipment it went into, a firm; left out where nobody said. */
  toOwnerId: uuid.optional(),
  phase: z.enum(['liquid', 'vapour'], 'must be liquid or vapour').optional(),
})
