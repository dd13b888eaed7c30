import { z } from 'zod'
import { uuid } from './parts'

/** A supervisor signs what a trainee recorded. */
export const details = z.strictObject({ eventId: uuid })
