import type { Readable } from 'node:stream'
import type { FleetListQuery } from '../../../utils/contract/custody'
import { FIRST_LAYOUT } from '../../../utils/contract/fleetLayout'
import { fleetCsvHeads, fleetCsvRow } from '../../../utils/fleet/fleetCsv'
import { csvStream, type CsvLine } from '../csv/csvStream'
import type { Database } from '../database/database'
import { fleet } from './fleet'

const ROWS_AT_ONCE = 500

/** The whole of a list of the fleet as a table of values, in the order asked for. */
export async function fleetCsv(db: Database, query: FleetListQuery, nowMs: number): Promise<Readable> {
  const { columns = FIRST_LAYOUT.columns, unit = 'lb', ...list } = query
  const first = await fleet(db, { ...list, cursor: undefined, limit: ROWS_AT_ONCE }, nowMs)
  async function* blocks(): AsyncGenerator<CsvLine[]> {
    for (let page = first; ;) {
      yield page.items.map(row => fleetCsvRow(row, columns, unit))
      if (page.nextCursor === null) return
      page = await fleet(db, { ...list, cursor: page.nextCursor, limit: ROWS_AT_ONCE }, nowMs)
    }
  }
  return csvStream(fleetCsvHeads(columns, unit), blocks())
}
