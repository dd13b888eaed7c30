import { z } from 'zod'
import { mass, uuid } from './parts'

/** A cylinder stands on a scale. */
export const details = z.strictObject({ gross: mass, scaleId: uuid.optional() })
