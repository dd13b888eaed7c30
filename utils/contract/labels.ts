import { z } from 'zod'

/** POST /api/labels. */
export const mintBody = z.strictObject({ count: z.number().int().min(1).max(100) })
export interface MintAnswer { codes: string[] }

/** GET /api/labels.pdf?codes=...&stock=...&start=... : one sheet or roll of identity labels. */
export const labelsQuery = z.strictObject({
  codes: z.string().min(9).max(2000),
  stock: z.enum(['roll-4x2', 'letter-10']).default('roll-4x2'),
  /** Position of the first label on a part-used sheet, from 1. */
  start: z.coerce.number().int().min(1).max(30).default(1),
})
