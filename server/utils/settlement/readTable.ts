import { CsvError, parse } from 'csv-parse/sync'
import type { CsvReading } from '~~/utils/contract/settlement'
import type { TableRow } from '~~/utils/settlement/statementCsv'
import { problem } from '../http/problem'

/** Far more than a shipment has lines. */
const MOST_ROWS = 1_000
const LONGEST_ROW = 20_000
const DELIMITERS = { comma: ',', semicolon: ';', tab: '\t' } as const
type Delimiter = keyof typeof DELIMITERS

/** A file's table of values, and what stood between its fields. */
export interface ReadTable { rows: TableRow[], delimiter: Delimiter }

/**
 * Reads a table of values. The encoding is UTF-8 unless a person chose the other; what does not decode is refused and
 * not guessed, for a wrong letter in a serial names another cylinder.
 *
 * Errors: 422 for another encoding, for what is no table, and for too many rows.
 */
export function readTable({ file, encoding, delimiter: chosen }: Pick<CsvReading, 'file' | 'encoding' | 'delimiter'>): ReadTable {
  const text = decoded(file, encoding)
  const delimiter = chosen ?? delimiterOf(text)
  try {
    const records = parse(text, {
      delimiter: DELIMITERS[delimiter], info: true, relax_column_count: true, skip_empty_lines: true, max_record_size: LONGEST_ROW, to: MOST_ROWS + 2,
    }) as unknown as { record: string[], info: { lines: number } }[]
    if (records.length > MOST_ROWS + 1) throw problem(422, 'Too many rows', `A statement may have at most ${MOST_ROWS.toLocaleString('en')} rows.`, undefined, { type: 'too-many-rows' })
    return { delimiter, rows: records.map(({ record, info }) => ({ row: info.lines, cells: record })) }
  }
  catch (error) {
    if (!(error instanceof CsvError)) throw error
    const { lines } = error as { lines?: number }
    const where = lines === undefined ? '' : ` in line ${lines}`
    throw problem(422, 'Not a table of values', error.code.includes('QUOTE') ? `A quotation mark stands where it should not, or is never closed${where}.` : `A row cannot be read${where}.`, undefined, { type: 'not-a-table' })
  }
}

function decoded(file: Uint8Array, encoding: CsvReading['encoding']): string {
  const isWide = (file[0] === 0xFF && file[1] === 0xFE) || (file[0] === 0xFE && file[1] === 0xFF)
  if (isWide || file.includes(0)) throw problem(422, 'Another encoding', 'The file is UTF-16 or no text at all. Save it as CSV in UTF-8.', undefined, { type: 'other-encoding' })
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(file)
  }
  catch {
    throw problem(422, 'Not UTF-8', 'The file is not UTF-8. Save it as CSV in UTF-8, or, where it comes from an older program, choose Windows-1252.', undefined, { type: 'not-utf-8' })
  }
}

/** The sign that stands most often in the first line, outside of quotation marks. */
function delimiterOf(text: string): Delimiter {
  const first = text.slice(0, LONGEST_ROW).split(/\r?\n|\r/, 1)[0]!.replace(/"[^"]*"/g, '')
  const count = (delimiter: Delimiter) => first.split(DELIMITERS[delimiter]).length
  return (['comma', 'semicolon', 'tab'] as const).reduce((best, each) => count(each) > count(best) ? each : best)
}
