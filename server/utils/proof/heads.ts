import { setImmediate as nextTurn } from 'node:timers/promises'
import type { ResultSet } from '@libsql/client'
import type { StreamHead } from '../../../utils/proof/checkpoint'
import type { Database } from '../database/database'

const CYLINDERS_AT_ONCE = 1_000

/** A cylinder's last line among the first so many of the log. */
export interface Head extends StreamHead { seq: number }

/**
 * How each cylinder's log ended when the log had come to a number, in the order of their ids.
 *
 * Lines are never changed, so what was there at a number is one picture, however long the reading takes.
 */
export async function* headsAt(db: Database, seq: number): AsyncGenerator<Head[]> {
  let after: string | null = null
  for (;;) {
    const { rows }: ResultSet = await db.readClient.execute({
      // The inner part is answered from the index alone.
      sql: `SELECT h.id, h.version, e.hash, e.seq FROM (
          SELECT cylinder_id AS id, max(version) AS version FROM custody_events WHERE seq <= ?${after === null ? '' : ' AND cylinder_id > ?'}
          GROUP BY cylinder_id ORDER BY cylinder_id LIMIT ${CYLINDERS_AT_ONCE}
        ) h JOIN custody_events e ON e.cylinder_id = h.id AND e.version = h.version ORDER BY h.id`,
      args: after === null ? [seq] : [seq, after],
    })
    const heads = rows.map(row => ({ cylinderId: row[0] as string, version: row[1] as number, hash: row[2] as string, seq: row[3] as number }))
    if (heads.length > 0) yield heads
    if (heads.length < CYLINDERS_AT_ONCE) return
    after = heads.at(-1)!.cylinderId
    await nextTurn()
  }
}
