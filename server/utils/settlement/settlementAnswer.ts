import type { SettlementAnswer, SettlementLine } from '~~/utils/contract/settlement'
import { settlementCredit } from '~~/utils/settlement/credit'
import { fourWeights } from '~~/utils/settlement/fourWeights'
import { stillMissing } from '~~/utils/settlement/missing'
import { instantText } from '../cylinder-lists/paging'
import { cylinderRows } from '../custody/fleet'
import type { Database } from '../database/database'
import { shipmentPhotos } from './disputePhotos'
import { disputesOf } from './disputes'
import { figuresIn, readSettlement } from './readSettlement'
import { filesOf } from './shipmentFiles'

/** A shipment's settlement with all that stands beside it. Errors: 404; 409 where it has not left. */
export async function settlementAnswer(db: Database, shipmentId: string, nowMs: number): Promise<SettlementAnswer> {
  const settlement = await readSettlement(db, shipmentId)
  const [rows, disputes, files, photos] = await Promise.all([
    cylinderRows(db, settlement.lines.map(line => line.cylinderId), nowMs), disputesOf(db, shipmentId), filesOf(db, shipmentId), shipmentPhotos(db, shipmentId),
  ])
  const figures = figuresIn(settlement)
  const lines = settlement.lines.flatMap(({ cylinderId, returnedAt, sent, ...line }): SettlementLine[] => {
    const found = rows.get(cylinderId)
    if (!found) return []
    return [{
      cylinder: found.row, version: found.version, sent,
      figures: line.figures, isEntered: line.isEntered, dock: line.dock,
      weights: fourWeights(sent, line.figures),
      photoIds: photos.get(cylinderId) ?? [],
      returnedAt: instantText(returnedAt),
    }]
  })
  return {
    shipment: settlement.shipment,
    revision: settlement.revision,
    lines,
    statement: settlement.statement,
    credit: settlementCredit(figures),
    missing: stillMissing(figures),
    unexpected: settlement.unexpected,
    disputes: disputes.map(({ endedMeasure: _, ...dispute }) => dispute),
    files,
  }
}
