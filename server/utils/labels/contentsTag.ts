import type { Access } from '~~/utils/access/roles'
import { printerOf, type ContentsTagQuery } from '~~/utils/contract/labels'
import { contentsTag, noTagBecause, tagDay, type ContentsTagAnswer } from '~~/utils/document/contentsTag'
import { contentsTagDrawing } from '~~/utils/document/contentsTagDrawing'
import { tagEntry } from '~~/utils/document/tagEntry'
import { labelUrl } from '~~/utils/label/code'
import { sheet } from '~~/utils/label/sheet'
import { LABEL_STOCKS } from '~~/utils/label/stock'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { custodyLog } from '../custody/custodyLog'
import { cylinderView } from '../custody/cylinderViews'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import { labelFonts } from '../pdf/fonts'
import { labelSheetPdf } from '../pdf/labelSheetPdf'

/** Who asks, when, and where symbols lead. */
export interface AskingForTag { access: Access, nowMs: number, publicUrl: string }

/** What the contents tag of a cylinder says, or in words why it gets none. */
export async function contentsTagOf(db: Database, id: string, { access, nowMs, publicUrl }: AskingForTag): Promise<ContentsTagAnswer> {
  const [view, log, { timeZone }] = await Promise.all([
    cylinderView(db, id, { access, nowMs }), custodyLog(db, id, { limit: Infinity }), directory(db),
  ])
  if (!view) throw problem(404, 'No such cylinder', 'No cylinder has this code, serial or id.')
  const refusal = noTagBecause(view)
  if (refusal !== null) return { refusal, tag: null }
  const tag = contentsTag(view, log.items, tagEntry(view.contents.refrigerant ?? '', CATALOGUE))
  const on = Date.parse(tag.on)
  return { refusal: null, tag, payload: labelUrl(publicUrl, tag.code), day: tagDay(on, timeZone) }
}

/** The tag as a PDF. Errors: 409 in words where the cylinder gets none. */
export async function printedContentsTag(db: Database, id: string, query: ContentsTagQuery, asking: AskingForTag): Promise<Buffer> {
  const answer = await contentsTagOf(db, id, asking)
  if (answer.refusal !== null) throw problem(409, 'No contents tag', answer.refusal)
  const stock = LABEL_STOCKS[query.stock]
  const printer = printerOf(query)
  return labelSheetPdf(sheet([contentsTagDrawing(answer, stock, printer.dotsPerInch)], stock, query.start, printer), await labelFonts(), { title: 'Contents tag' })
}
