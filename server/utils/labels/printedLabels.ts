import { printerOf, type LabelsQuery } from '~~/utils/contract/labels'
import { adviceLabel } from '~~/utils/document/adviceLabel'
import { formatLabelCode, labelUrl } from '~~/utils/label/code'
import type { LabelDrawing } from '~~/utils/label/drawing'
import type { LabelledStamp } from '~~/utils/label/identityContent'
import { identityLabel, symbolFit } from '~~/utils/label/identityLabel'
import { sheet } from '~~/utils/label/sheet'
import { LABEL_STOCKS } from '~~/utils/label/stock'
import { firm } from '~~/drizzle/schema'
import { cylinderStates } from '../custody/cylinderViews'
import { CLAIM_ORDER } from '../custody/findCylinder'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { labelFonts } from '../pdf/fonts'
import { labelSheetPdf } from '../pdf/labelSheetPdf'
import { labelledStamp } from './labelledStamp'

const MISFITS = {
  'too-curved': 'Round a cylinder this narrow a tilted phone would not read it. Print it without the diameter, for the flat of the guard, or on larger stock.',
  'no-room': 'The address of this server is too long for labels of this size. Take larger stock.',
} as const

const COPIES = [1, 2] as const

/**
 * Both labels of each code as a PDF: what the collar says where a cylinder carries the code, else blank ones to write on.
 *
 * Errors: 404 naming the codes that were neither minted here nor are on a cylinder; 409 for one that was replaced; 422 where the symbol would not be read.
 */
export async function printedLabels(db: Database, query: LabelsQuery, publicUrl: string): Promise<Buffer> {
  const { codes, diameter: diameterMm = null } = query
  const stock = LABEL_STOCKS[query.stock]
  const printer = printerOf(query)
  const fitting = { stock, dotsPerInch: printer.dotsPerInch, diameterMm }
  const misfit = codes.map(code => symbolFit(labelUrl(publicUrl, code), fitting).is).find(is => is === 'too-curved' || is === 'no-room')
  if (misfit) throw problem(422, 'The symbol does not fit', MISFITS[misfit])
  const [stamps, owner] = await Promise.all([stampsByCode(db, codes), db.read.select().from(firm).limit(1)])
  const labels = codes.flatMap(code => COPIES.map(copy => identityLabel({
    code,
    payload: labelUrl(publicUrl, code),
    owner: owner[0]?.name ?? '',
    telephone: owner[0]?.telephone ?? null,
    copy,
    stamp: stamps.get(code) ?? null,
  }, fitting)))
  const printed = query.advice ? [adviceLabel(stock), ...labels] : labels
  return labelSheetPdf(sheet<LabelDrawing>(printed, stock, query.start, printer), await labelFonts())
}

/** The collar of the cylinder that has each code; null for a code that is on none yet. */
async function stampsByCode(db: Database, codes: readonly string[]): Promise<Map<string, LabelledStamp | null>> {
  const list = JSON.stringify(codes)
  const [minted, claims] = await db.readClient.batch([
    { sql: 'SELECT code FROM labels WHERE code IN (SELECT value FROM json_each(?))', args: [list] },
    { sql: `SELECT code, cylinder_id FROM label_claims WHERE code IN (SELECT value FROM json_each(?)) ORDER BY ${CLAIM_ORDER}`, args: [list] },
  ], 'read')
  // Of several cylinders with one code the first in effect has it.
  const carriers = new Map((claims?.rows ?? []).toReversed().map(row => [row[0] as string, row[1] as string]))
  const known = new Set([...carriers.keys(), ...(minted?.rows ?? []).map(row => row[0] as string)])
  const unknown = codes.filter(code => !known.has(code))
  if (unknown.length > 0) throw problem(404, 'No such label', `Nobody made ${unknown.join(', ')}.`)

  const states = await cylinderStates(db, [...new Set(carriers.values())])
  return new Map(codes.map((code) => {
    const state = states.get(carriers.get(code) ?? '')
    if (state && state.labelCode !== code) {
      throw problem(409, 'That label was replaced', `${formatLabelCode(code)} was replaced${state.labelCode ? ` by ${formatLabelCode(state.labelCode)}` : ''}. It still opens its cylinder, and is printed no more.`)
    }
    return [code, state?.stamp ? labelledStamp(state.stamp, state.tare) : null]
  }))
}
