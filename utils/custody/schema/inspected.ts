import { z } from 'zod'
import { DAMAGE_REASONS } from '../damage'

const reasons = z.array(z.enum(DAMAGE_REASONS, `must be one of ${DAMAGE_REASONS.join(', ')}`))
  .min(1, 'must name what was found').max(DAMAGE_REASONS.length, 'must name each once')
  .refine(found => new Set(found).size === found.length, 'must name each once')

/** The outside of a cylinder is looked at. What more there is to say of a damage is the event's note. */
export const details = z.discriminatedUnion('result', [
  z.strictObject({ result: z.literal('sound') }),
  z.strictObject({ result: z.literal('damaged'), reasons: reasons.optional() }),
], 'must have a result: sound or damaged')
