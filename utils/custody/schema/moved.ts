import { z } from 'zod'
import { uuid } from './parts'

/** A cylinder goes to another place, with its holder where that place has one. */
export const details = z.strictObject({ toPlaceId: uuid, toHolderId: uuid.optional() })
