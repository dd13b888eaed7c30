import type { InStatement } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { rebuiltCache } from './caches'
import { logRow, recordedEvent, SELECT_LOG } from './logRow'
import { refreshedRows } from './refreshedRows'

const PAGE_ROWS = 1_000

/**
 * Makes every cache of the custody log again from the log alone, cylinder by cylinder.
 *
 * @returns how many cylinders and events it went through.
 */
export async function rebuildCaches(db: Database, nowMs: number): Promise<{ cylinders: number, events: number }> {
  const from = await directory(db, true)
  await db.write(['DELETE FROM movements', 'DELETE FROM stock_changes', 'DELETE FROM label_claims', 'DELETE FROM halves', 'DELETE FROM cylinders'])
  let cylinders = 0
  let events = 0
  let waiting: InStatement[] = []
  let open: AnyRecordedEvent[] = []
  const close = () => {
    if (open.length === 0) return
    waiting.push(...rebuiltCache(open[0]!.cylinderId, open, from, nowMs))
    cylinders++
    open = []
  }
  let after: [string, number] | null = null
  for (;;) {
    const result = await db.readClient.execute({
      sql: `${SELECT_LOG} ${after ? 'WHERE (cylinder_id, version) > (?, ?)' : ''} ORDER BY cylinder_id, version LIMIT ${PAGE_ROWS}`,
      args: after ?? [],
    })
    for (const raw of result.rows) {
      const event = recordedEvent(logRow(raw))
      if (open[0] && open[0].cylinderId !== event.cylinderId) close()
      open.push(event)
      events++
      after = [event.cylinderId, event.version]
    }
    if (result.rows.length < PAGE_ROWS) close()
    await db.write(waiting)
    waiting = []
    if (result.rows.length < PAGE_ROWS) break
  }
  await refreshBothSides(db, nowMs)
  return { cylinders, events }
}

/** Once every log was read, the rows that rest on what other cylinders' logs say: one code on two, and halves of a pair. */
async function refreshBothSides(db: Database, nowMs: number): Promise<void> {
  const both = await db.readClient.execute(`SELECT a.cylinder_id FROM label_claims a JOIN label_claims b ON a.code = b.code AND a.cylinder_id <> b.cylinder_id
    UNION SELECT cylinder_id FROM halves`)
  const ids = both.rows.map(row => row[0] as string)
  for (let from = 0; from < ids.length; from += PAGE_ROWS) await db.write(await refreshedRows(db, ids.slice(from, from + PAGE_ROWS), nowMs))
}
