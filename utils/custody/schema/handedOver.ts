import { z } from 'zod'
import { uuid } from './parts'

/** A cylinder passes from hand to hand. */
export const details = z.strictObject({ toHolderId: uuid })
