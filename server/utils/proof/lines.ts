import { setImmediate as nextTurn } from 'node:timers/promises'
import type { ResultSet } from '@libsql/client'
import { LOG_COLUMNS, type LogRow } from '../custody/logRow'
import type { Database } from '../database/database'

const LINES_AT_ONCE = 1_000

/**
 * The lines of the log after one number and up to another, cylinder by cylinder, some at a time; others have their turn
 * in between.
 */
export async function* linesBetween(db: Database, after: number, reach: number): AsyncGenerator<LogRow[]> {
  let last: { cylinderId: string, version: number } | null = null
  for (;;) {
    const { rows }: ResultSet = await db.readClient.execute({
      // The index holds the numbers too, so what lies outside costs no look at the table.
      sql: `SELECT ${LOG_COLUMNS.join(', ')} FROM custody_events INDEXED BY custody_events_cylinder_version
        WHERE seq > ? AND seq <= ? ${last ? 'AND (cylinder_id, version) > (?, ?)' : ''} ORDER BY cylinder_id, version LIMIT ${LINES_AT_ONCE}`,
      args: [after, reach, ...(last ? [last.cylinderId, last.version] : [])],
    })
    // The driver's rows are read by name, as they are: a copy of each would cost more than its hash.
    const lines = rows as unknown as LogRow[]
    if (lines.length > 0) yield lines
    if (lines.length < LINES_AT_ONCE) return
    last = { cylinderId: lines.at(-1)!.cylinder_id, version: lines.at(-1)!.version }
    await nextTurn()
  }
}
