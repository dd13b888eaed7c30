import { z } from 'zod'
import { mass, uuid } from './parts'

/** A firm gives a cylinder back to us. */
export const details = z.strictObject({ fromFirmId: uuid, gross: mass.optional() })
