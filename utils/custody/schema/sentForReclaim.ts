import { z } from 'zod'
import { mass, uuid } from './parts'

/** A cylinder leaves on a shipment to a reclaimer. */
export const details = z.strictObject({ shipmentId: uuid, gross: mass })
