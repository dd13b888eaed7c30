import type { Access } from '~~/utils/access/roles'
import type { PaperDifference, Shipment, ShipmentLine, ShipmentWithLines } from '~~/utils/contract/shipments'
import { notShippable } from '~~/utils/custody/findings/record'
import { readingGrams } from '~~/utils/quantity/mass'
import type { ShippingPapers } from '~~/utils/transport/shippingPapers'
import { instantText } from '../cylinder-lists/paging'
import { cylinderRows } from '../custody/fleet'
import type { Database } from '../database/database'
import { judgeLines, type JudgedLine } from './judgeLines'
import { paperDifferences } from './paperDifferences'
import { makePapers } from './papers'
import { receiptsOf } from './receipts'
import { shipmentLines, type StoredLine } from './shipmentLines'
import { theShipment } from './shipments'

/** A shipment that has not left, judged as it stands: each line, and what its papers would say. */
export interface ShipmentJudged { lines: ReadonlyMap<string, JudgedLine>, papers: ShippingPapers, hasTerms: boolean }

/** A shipment with its lines: until it leaves each with why it may not, afterwards each as it left. Errors: 404. */
export async function shipmentWithLines(db: Database, id: string, access: Access, nowMs: number): Promise<ShipmentWithLines> {
  return (await judgedShipment(db, id, access, nowMs)).shipment
}

/** The same with what it was judged by; null once it has left, or was given up. Errors: 404. */
export async function judgedShipment(db: Database, id: string, access: Access, nowMs: number): Promise<{ shipment: ShipmentWithLines, judged: ShipmentJudged | null }> {
  const [shipment, stored] = await Promise.all([theShipment(db, id), shipmentLines(db, id)])
  const isOpen = shipment.state === 'draft' || shipment.state === 'ready'
  const [rows, judged, receipts, differing] = await Promise.all([
    cylinderRows(db, stored.map(line => line.cylinderId), nowMs),
    isOpen ? judge(db, shipment, stored, { access, nowMs }) : null,
    receiptsOf(db, id),
    shipment.dispatchedAt === null ? new Map<string, PaperDifference>() : paperDifferences(db, id, stored),
  ])
  const lines = stored.flatMap((line): ShipmentLine[] => {
    const { cylinderId, sent, returnedAt } = line
    const found = rows.get(cylinderId)
    if (!found) return []
    const verdict = judged?.lines.get(cylinderId)
    return [{
      cylinder: found.row,
      version: found.version,
      because: verdict?.because ?? [],
      weighed: weighingOf(line, found.version, verdict),
      sent,
      ...differing.has(cylinderId) && { differs: differing.get(cylinderId) },
      received: receipts.get(cylinderId) ?? null,
      returnedAt: instantText(returnedAt),
    }]
  })
  const papersLack = judged?.papers.missing.flatMap(({ cylinderId, text }) => cylinderId === null ? [text] : []) ?? []
  return { shipment: { ...shipment, lines, papersLack, isUnasked: judged?.hasTerms === false }, judged }
}

/** What its papers cannot say of a line holds that line back. */
async function judge(db: Database, shipment: Shipment, stored: readonly StoredLine[], { access, nowMs }: { access: Access, nowMs: number }): Promise<ShipmentJudged> {
  const toJudge = stored.map(({ cylinderId, weighed }) => ({ cylinderId, gross: weighed?.gross ?? null }))
  const { lines, hasTerms } = await judgeLines(db, toJudge, { toFirmId: shipment.to.id, access, nowMs })
  const papers = await makePapers(db, shipment.id, lines.map(({ cylinderId, figures }) => ({ cylinderId, sent: figures })), { access, nowMs })
  return {
    papers, hasTerms,
    lines: new Map(lines.map(line => [line.cylinderId, {
      ...line,
      because: [...line.because, ...papers.missing.flatMap(({ cylinderId, text, source }) => cylinderId === line.cylinderId ? [notShippable(text, source)] : [])],
    }])),
  }
}

function weighingOf({ weighed, sent }: StoredLine, version: number, verdict: JudgedLine | undefined): ShipmentLine['weighed'] {
  if (weighed === null) return null
  const { gross, at, by } = weighed
  return {
    gross, grossGrams: readingGrams(gross), netGrams: (sent ?? verdict?.figures)?.netGrams ?? null,
    at: instantText(at)!, by, isStale: sent === null && weighed.version !== version,
  }
}
