import { z } from 'zod'
import { prose, uuid } from './parts'

/** An event is taken out, or other details stand in its place. Those are parsed by the kind of the event they mend. */
export const details = z.strictObject({
  eventId: uuid,
  reason: prose(500),
  instead: z.record(z.string(), z.unknown(), 'must be the details of the event').optional(),
})
