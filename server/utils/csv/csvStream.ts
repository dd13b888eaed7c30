import { Readable } from 'node:stream'
import { stringify } from 'csv-stringify/sync'

/** One line of a table of values. */
export type CsvLine = (string | number | null)[]

/**
 * A table of values as it is made, some lines at a time, so that a long one needs no more memory than a short one.
 *
 * Source: RFC 4180: lines end with CRLF, a field with a comma, a quote or a line break stands in quotes.
 */
export function csvStream(heads: string[], blocks: AsyncIterable<CsvLine[]>): Readable {
  async function* text(): AsyncGenerator<string> {
    yield stringify([heads], { record_delimiter: 'windows' })
    for await (const lines of blocks) yield stringify(lines, { record_delimiter: 'windows' })
  }
  return Readable.from(text(), { objectMode: false })
}
