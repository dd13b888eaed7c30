import type { InStatement } from '@libsql/client'
import type { AnyRecordedEvent } from '../../../utils/custody/event'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { rebuiltCache } from './caches'
import { foldContext } from './foldContext'
import { logRow, recordedEvent, SELECT_LOG } from './logRow'

const PAGE_ROWS = 1_000

/**
 * Makes every cache of the custody log again from the log alone, cylinder by cylinder.
 *
 * @returns how many cylinders and events it went through.
 */
export async function rebuildCaches(db: Database): Promise<{ cylinders: number, events: number }> {
  const context = foldContext(await directory(db, true))
  await db.write(['DELETE FROM movements', 'DELETE FROM label_claims', 'DELETE FROM cylinders'])
  let cylinders = 0
  let events = 0
  let waiting: InStatement[] = []
  let open: AnyRecordedEvent[] = []
  const close = () => {
    if (open.length === 0) return
    waiting.push(...rebuiltCache(open[0]!.cylinderId, open, context))
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
    if (result.rows.length < PAGE_ROWS) return { cylinders, events }
  }
}
