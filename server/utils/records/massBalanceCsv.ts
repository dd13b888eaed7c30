import type { Readable } from 'node:stream'
import type { MassBalanceAnswer } from '../../../utils/contract/massBalance'
import { BALANCE_CSV_HEADS, balanceCsvRows } from '../../../utils/records/balanceCsv'
import { csvStream, type CsvLine } from '../csv/csvStream'

/** A balance as a table of values, each owner of each refrigerant a line. */
export function massBalanceCsv({ period, balances }: MassBalanceAnswer): Readable {
  async function* blocks(): AsyncGenerator<CsvLine[]> {
    for (const balance of balances) yield balanceCsvRows(period, balance)
  }
  return csvStream(BALANCE_CSV_HEADS, blocks())
}
