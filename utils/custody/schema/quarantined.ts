import { z } from 'zod'
import { prose } from './parts'

/** A cylinder is set apart: nothing goes in until it is released. */
export const details = z.strictObject({ reason: prose(300) })
