import { z } from 'zod'
import { normaliseLabelCode } from '../label/code'
import type { HostBudget } from '../label/symbol'
import { LEAST_DIAMETER_MM, MOST_DIAMETER_MM } from '../label/diameter'
import { offsetsFor, printerChoices, type LabelPrinter } from '../label/printer'
import { LABEL_STOCKS, labelsPerPage, takesTag, type LabelStockId } from '../label/stock'
import { MOST_LABELS } from './printing'

/** POST /api/labels. */
export const mintBody = z.strictObject({ count: z.number().int().min(1).max(100) })
/** What POST /api/labels answers. */
export interface MintAnswer { codes: string[] }

/** GET /api/labels/address: what the symbols of labels lead to, and what its length makes of them. */
export interface LabelAddress extends HostBudget { publicUrl: string }

const codeList = z.string().max(2000).transform((text, context) => {
  const typed = text.split(',').map(one => one.trim()).filter(one => one !== '')
  const codes = typed.flatMap(one => normaliseLabelCode(one) ?? [])
  if (codes.length > 0 && codes.length === typed.length && codes.length <= MOST_LABELS) return [...new Set(codes)]
  const wrong = typed.filter(one => normaliseLabelCode(one) === null)
  context.addIssue({ code: 'custom', message: wrong.length > 0 ? `not a label code: ${wrong.join(', ')}` : `must be 1 to ${MOST_LABELS} label codes` })
  return z.NEVER
})

const stockId = z.enum(Object.keys(LABEL_STOCKS) as [LabelStockId, ...LabelStockId[]])

/** How a page is printed: on which stock, by how fine a printer, and how far its print is moved to the right and down. */
const printing = {
  stock: stockId.default('roll-4x2'),
  dpi: z.coerce.number().optional(),
  x: z.coerce.number().default(0),
  y: z.coerce.number().default(0),
}

interface AskedPrinting { stock: LabelStockId, dpi?: number, x: number, y: number }

/** The printer that a request names. */
export function printerOf({ stock, dpi, x, y }: AskedPrinting): LabelPrinter {
  return { dotsPerInch: dpi ?? LABEL_STOCKS[stock].dotsPerInch, offset: { x, y } }
}

function isPrintable({ stock, dpi, x, y }: AskedPrinting, context: z.RefinementCtx) {
  const offsets = offsetsFor(LABEL_STOCKS[stock])
  const fault = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message })
  if (dpi !== undefined && !printerChoices(LABEL_STOCKS[stock]).includes(dpi)) fault('dpi', 'is no printer for this stock')
  if (!offsets.includes(x)) fault('x', `must be in steps of 0.5 up to ${offsets.at(-1)}`)
  if (!offsets.includes(y)) fault('y', `must be in steps of 0.5 up to ${offsets.at(-1)}`)
}

/** Position of the first label on a part-used sheet, from 1. */
const start = z.coerce.number().int().min(1).default(1)

function beginsOnPage({ stock, start }: { stock: LabelStockId, start: number }, context: z.RefinementCtx) {
  if (start > labelsPerPage(LABEL_STOCKS[stock])) context.addIssue({ code: 'custom', path: ['start'], message: 'the sheet has no such position' })
}

/** GET /api/labels.pdf?codes=...&stock=...&start=... : both labels of each code. 404 for codes that nobody minted or stuck on. */
export const labelsQuery = z.strictObject({
  codes: codeList,
  ...printing,
  start,
  /** Of the cylinders, in millimetres; left out for a flat place. */
  diameter: z.coerce.number().min(LEAST_DIAMETER_MM).max(MOST_DIAMETER_MM).optional(),
  /** Whether a label before the first says what to mind before one is stuck on. */
  advice: z.literal('1').optional(),
}).superRefine(isPrintable).superRefine(beginsOnPage)
export type LabelsQuery = z.output<typeof labelsQuery>

/** GET /api/labels/test-page.pdf?stock=... : rulers and frames. */
export const testPageQuery = z.strictObject(printing).superRefine(isPrintable)

/** GET /api/cylinders/{ref}/contents-tag.pdf?stock=... : 409 where nothing, or nothing known, is in it. */
export const contentsTagQuery = z.strictObject({ ...printing, start }).superRefine(isPrintable).superRefine(beginsOnPage)
  .refine(({ stock }) => takesTag(LABEL_STOCKS[stock]), { path: ['stock'], message: 'is too small for a contents tag' })
export type ContentsTagQuery = z.output<typeof contentsTagQuery>
