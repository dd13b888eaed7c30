import { setResponseHeaders, type H3Event } from 'h3'
import type { SettlementCsvQuery } from '~~/utils/contract/settlement'
import { emptyStatement, settlementTable as tableOf, type SettlementTable } from '~~/utils/shipment/settlementTable'
import { csvStream } from '../csv/csvStream'
import { endWithAnswer } from '../csv/endWithAnswer'
import type { Database } from '../database/database'
import { settlementAnswer } from './settlementAnswer'

/** A table of values and what its file is called. */
export interface NamedTable extends SettlementTable { name: string }

/** A shipment's settlement as a table, or the empty one that a reclaimer fills in. Errors: 404; 409 where it has not left. */
export async function settlementTable(db: Database, shipmentId: string, { unit, empty }: SettlementCsvQuery, nowMs: number): Promise<NamedTable> {
  const { shipment, lines, credit } = await settlementAnswer(db, shipmentId, nowMs)
  const number = String(shipment.number).padStart(4, '0')
  return empty === 'yes'
    ? { ...emptyStatement(lines, unit), name: `statement-${number}.csv` }
    : { ...tableOf(lines, credit, unit), name: `settlement-${number}.csv` }
}

/** Answers with a table as a file. */
export function sendCsv(event: H3Event, { heads, rows, name }: NamedTable) {
  setResponseHeaders(event, { 'Content-Type': 'text/csv; charset=utf-8', 'Content-Disposition': `attachment; filename="${name}"`, 'Cache-Control': 'no-store' })
  async function* all() {
    yield rows
  }
  const stream = csvStream(heads, all())
  endWithAnswer(event, stream)
  return stream
}
