import { z } from 'zod'
import { month, newTare, retestMethod, rin, suffix, uuid } from './parts'

/** A requalifier has tested a cylinder. */
export const details = z.strictObject({
  month,
  method: retestMethod,
  result: z.enum(['passed', 'rejected', 'condemned'], 'must be passed, rejected or condemned'),
  requalifierId: uuid,
  rin: rin.optional(),
  suffix: suffix.optional(),
  newTare: newTare.optional(),
})
