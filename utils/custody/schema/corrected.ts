import { z } from 'zod'
import { prose, uuid } from './parts'

/** Deeper than the details of any kind. */
const DEEPEST = 8

/** An event is taken out, or other details stand in its place. Those are parsed by the kind of the event they mend. */
export const details = z.strictObject({
  eventId: uuid,
  reason: prose(500),
  instead: z.record(z.string(), z.unknown(), 'must be the details of the event')
    .refine(value => canBeHashed(value, DEEPEST), 'must be the details of the event').optional(),
})

// Until the event it mends is known nothing else bounds it, and its hash needs JSON: JSON has no number beyond all bounds.
function canBeHashed(value: unknown, deepest: number): boolean {
  if (typeof value === 'number') return Number.isFinite(value)
  if (typeof value !== 'object' || value === null) return true
  return deepest > 0 && Object.values(value).every(part => canBeHashed(part, deepest - 1))
}
