import { z } from 'zod'
import { uuid } from './parts'

/** A missing cylinder is there again. */
export const details = z.strictObject({ placeId: uuid.optional() })
