import { z } from 'zod'
import { normaliseLabelCode } from '../label/code'
import { LABEL_STOCKS, labelsPerPage } from '../label/stock'

/** POST /api/labels. */
export const mintBody = z.strictObject({ count: z.number().int().min(1).max(100) })
export interface MintAnswer { codes: string[] }

/** Most codes on one printing. */
export const MOST_LABELS = 100

const codeList = z.string().max(2000).transform((text, context) => {
  const typed = text.split(',').map(one => one.trim()).filter(one => one !== '')
  const codes = typed.flatMap(one => normaliseLabelCode(one) ?? [])
  if (codes.length > 0 && codes.length === typed.length && codes.length <= MOST_LABELS) return [...new Set(codes)]
  const wrong = typed.filter(one => normaliseLabelCode(one) === null)
  context.addIssue({ code: 'custom', message: wrong.length > 0 ? `not a label code: ${wrong.join(', ')}` : `must be 1 to ${MOST_LABELS} label codes` })
  return z.NEVER
})

/** GET /api/labels.pdf?codes=...&stock=...&start=... : both labels of each code. 404 for codes that nobody minted or stuck on. */
export const labelsQuery = z.strictObject({
  codes: codeList,
  stock: z.enum(['roll-4x2', 'letter-10']).default('roll-4x2'),
  /** Position of the first label on a part-used sheet, from 1. */
  start: z.coerce.number().int().min(1).max(30).default(1),
}).refine(query => query.start <= labelsPerPage(LABEL_STOCKS[query.stock]), { path: ['start'], message: 'the sheet has no such position' })
