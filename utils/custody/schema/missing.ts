import { z } from 'zod'
import { prose } from './parts'

/** A cylinder is not where it should be. `lastSeen` says in words where, when and by whom it was seen last. */
export const details = z.strictObject({ lastSeen: prose(300).optional() })
