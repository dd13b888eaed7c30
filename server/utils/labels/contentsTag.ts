import type { Access } from '~~/utils/access/roles'
import { printerOf, type ContentsTagQuery } from '~~/utils/contract/labels'
import { contentsTag, noTagBecause, type ContentsTagAnswer, type TagEntry } from '~~/utils/document/contentsTag'
import { contentsTagDrawing } from '~~/utils/document/contentsTagDrawing'
import { labelUrl } from '~~/utils/label/code'
import { sheet } from '~~/utils/label/sheet'
import { LABEL_STOCKS } from '~~/utils/label/stock'
import { formatDay, wallClock } from '~~/utils/quantity/instant'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { noUnEntryBecause, unEntryOf } from '~~/utils/refrigerant/unEntry'
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
  const tag = contentsTag(view, log.items, entryOf(view.contents.refrigerant ?? ''))
  const on = Date.parse(tag.on)
  return { refusal: null, tag, payload: labelUrl(publicUrl, tag.code), day: `${formatDay(on, timeZone)} ${wallClock(on, timeZone).year}` }
}

/** The tag as a PDF. Errors: 409 in words where the cylinder gets none. */
export async function printedContentsTag(db: Database, id: string, query: ContentsTagQuery, asking: AskingForTag): Promise<Buffer> {
  const answer = await contentsTagOf(db, id, asking)
  if (answer.refusal !== null) throw problem(409, 'No contents tag', answer.refusal)
  const stock = LABEL_STOCKS[query.stock]
  const printer = printerOf(query)
  return labelSheetPdf(sheet([contentsTagDrawing(answer, stock, printer.dotsPerInch)], stock, query.start, printer), await labelFonts(), { title: 'Contents tag' })
}

function entryOf(designation: string): TagEntry {
  const refrigerant = CATALOGUE.refrigerants.get(designation)
  const blend = CATALOGUE.compositions.get(designation)
  const named = refrigerant ?? (blend && { designation, composition: [...blend.components], safetyClass: null })
  const entry = named && unEntryOf(named)
  if (entry) return { un: entry.un, properShippingName: entry.properShippingName, judgement: entry.judgement, source: entry.source }
  const judgement = named ? noUnEntryBecause(named) : 'The catalogue does not have it: the shipper classifies it (49 CFR 173.22).'
  return { un: null, properShippingName: null, judgement, source: null }
}
