import { z } from 'zod'
import { line, mass, uuid } from './parts'

/** A cylinder comes to a place of ours. */
export const details = z.strictObject({ fromFirmId: uuid.optional(), gross: mass.optional(), paper: line(120).optional() })
