import { z } from 'zod'
import { mass, vacuum } from './parts'

/** A cylinder is emptied; only a deep vacuum leaves nothing in it. */
export const details = z.strictObject({ grossAfter: mass.optional(), vacuum: vacuum.optional() })
