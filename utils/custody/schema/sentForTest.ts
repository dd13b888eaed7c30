import { z } from 'zod'
import { uuid } from './parts'

/** A cylinder leaves with a lot for requalification. */
export const details = z.strictObject({ lotId: uuid })
