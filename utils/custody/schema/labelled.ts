import { z } from 'zod'
import { labelCode, line } from './parts'

/** A label is stuck on; the code it replaces still opens the cylinder. */
export const details = z.strictObject({ code: labelCode, replaces: labelCode.optional(), reason: line(200).optional() })
