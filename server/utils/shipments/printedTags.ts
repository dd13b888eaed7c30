import { printerOf, type ContentsTagQuery } from '~~/utils/contract/labels'
import { contentsTag, noTagBecause, tagDay } from '~~/utils/document/contentsTag'
import { contentsTagDrawing } from '~~/utils/document/contentsTagDrawing'
import { labelUrl } from '~~/utils/label/code'
import { sheet } from '~~/utils/label/sheet'
import { LABEL_STOCKS } from '~~/utils/label/stock'
import { withTechnicalNames } from '~~/utils/refrigerant/unEntry'
import type { DescribedLine } from '~~/utils/transport/shippingPapers'
import { custodyLog } from '../custody/custodyLog'
import { cylinderViews } from '../custody/cylinderViews'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'
import type { AskingForTag } from '../labels/contentsTag'
import { labelFonts } from '../pdf/fonts'
import { labelSheetPdf } from '../pdf/labelSheetPdf'
import { papersOf } from './papersOf'

/**
 * The contents tags of a shipment's cylinders in its order, each naming its contents as the papers do. What has nothing in
 * it, or is not classified, gets none.
 *
 * Errors: 404; 409 where none of them gets one.
 */
export async function printedTags(db: Database, shipmentId: string, query: ContentsTagQuery, { access, nowMs, publicUrl }: AskingForTag): Promise<Buffer> {
  const { papers } = await papersOf(db, shipmentId, { access, nowMs })
  const [views, { timeZone }] = await Promise.all([cylinderViews(db, papers.lines.map(({ cylinderId }) => cylinderId), { access, nowMs }), directory(db)])
  const stock = LABEL_STOCKS[query.stock]
  const printer = printerOf(query)
  const lineOf = new Map(papers.lines.map(line => [line.cylinderId, line]))
  const drawn = await Promise.all(views.map(async (view) => {
    const line = lineOf.get(view.id)!
    if (line.description.needsChoice || noTagBecause(view, line.isShippersWord) !== null) return []
    const { items } = await custodyLog(db, view.id, { limit: Infinity })
    const tag = contentsTag(view, items, entryOf(line), line.isShippersWord)
    return [contentsTagDrawing({ tag, payload: labelUrl(publicUrl, tag.code), day: tagDay(Date.parse(tag.on), timeZone) }, stock, printer.dotsPerInch)]
  }))
  const tags = drawn.flat()
  if (tags.length === 0) throw problem(409, 'No contents tag', 'None of its cylinders gets one: nothing is in them, or how they travel is not said yet.')
  return labelSheetPdf(sheet(tags, stock, query.start, printer), await labelFonts(), { title: 'Contents tags' })
}

/** Source: 49 CFR 172.301(a), (b): number, proper shipping name and technical names as the paper has them. */
function entryOf({ description: { identification, properShippingName, technicalNames, because, source } }: DescribedLine) {
  return {
    un: identification, judgement: because, source,
    properShippingName: properShippingName === null ? null : withTechnicalNames(properShippingName, technicalNames),
  }
}
