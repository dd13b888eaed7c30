import { identityLabel, type LabelledStamp } from '~~/utils/label/identityLabel'
import { labelUrl } from '~~/utils/label/code'
import { sheet } from '~~/utils/label/sheet'
import { LABEL_STOCKS, type LabelStockId } from '~~/utils/label/stock'
import { firm } from '~~/drizzle/schema'
import { cylinderStates } from '../custody/cylinderViews'
import { CLAIM_ORDER } from '../custody/findCylinder'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { labelFonts } from '../pdf/fonts'
import { labelSheetPdf } from '../pdf/labelSheetPdf'
import { labelledStamp } from './labelledStamp'

/** Which labels to print, on what, and where their symbols lead. */
export interface Printing { codes: readonly string[], stock: LabelStockId, start: number, publicUrl: string }

const COPIES = [1, 2] as const

/**
 * Both labels of each code as a PDF: what the collar says where a cylinder carries the code, else blank ones to write on.
 *
 * Errors: 404 naming the codes that were neither minted here nor are on a cylinder.
 */
export async function printedLabels(db: Database, { codes, stock, start, publicUrl }: Printing): Promise<Buffer> {
  const [stamps, owner] = await Promise.all([stampsByCode(db, codes), db.read.select().from(firm).limit(1)])
  const labels = codes.flatMap(code => COPIES.map(copy => identityLabel({
    code,
    payload: labelUrl(publicUrl, code),
    owner: owner[0]?.name ?? '',
    telephone: owner[0]?.telephone ?? null,
    copy,
    stamp: stamps.get(code) ?? null,
  }, LABEL_STOCKS[stock])))
  return labelSheetPdf(sheet(labels, LABEL_STOCKS[stock], start), await labelFonts())
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
    return [code, state?.stamp ? labelledStamp(state.stamp, state.tare) : null]
  }))
}
