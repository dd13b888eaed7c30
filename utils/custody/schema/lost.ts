import { z } from 'zod'
import { mass } from './parts'

/** Refrigerant escapes. */
export const details = z.strictObject({
  grossAfter: mass.optional(),
  cause: z.enum(['leak', 'relief', 'hose', 'accident', 'unknown'], 'must be leak, relief, hose, accident or unknown'),
  unavoidable: z.boolean().optional(),
})
