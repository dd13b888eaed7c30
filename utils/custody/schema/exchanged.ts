import { z } from 'zod'
import { uuid } from './parts'

/** One cylinder's half of an exchange: one goes to a firm, another comes from it. */
export const details = z.strictObject({
  otherCylinderId: uuid,
  direction: z.enum(['out', 'in'], 'must be out or in'),
  /** Both halves carry it. */
  exchangeId: uuid,
  firmId: uuid,
})
