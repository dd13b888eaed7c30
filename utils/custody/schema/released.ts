import { z } from 'zod'
import { prose } from './parts'

/** A cylinder that was set apart may be used again. */
export const details = z.strictObject({ reason: prose(300) })
