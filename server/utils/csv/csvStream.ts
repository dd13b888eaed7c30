import { Readable } from 'node:stream'
import { stringify } from 'csv-stringify/sync'

/** One line of a table of values. */
export type CsvLine = (string | number | null)[]

// What begins with a sign and is a plain figure is none.
const FORMULA = /^(?:[=@\t\r]|[+-](?![\d.]*$))/

/**
 * A table of values as it is made, some lines at a time, so that a long one needs no more memory than a short one.
 *
 * A text that a spreadsheet would work out as a formula has an apostrophe before it: it may be a stranger's.
 *
 * Source: RFC 4180: lines end with CRLF, a field with a comma, a quote or a line break stands in quotes.
 */
export function csvStream(heads: string[], blocks: AsyncIterable<CsvLine[]>): Readable {
  async function* text(): AsyncGenerator<string> {
    yield stringify([heads], { record_delimiter: 'windows' })
    for await (const lines of blocks) yield stringify(lines.map(line => line.map(asText)), { record_delimiter: 'windows' })
  }
  return Readable.from(text(), { objectMode: false })
}

function asText(cell: CsvLine[number]): CsvLine[number] {
  return typeof cell === 'string' && FORMULA.test(cell) ? `'${cell}` : cell
}
