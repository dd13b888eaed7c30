import type { AnyRecordedEvent } from '../../../utils/custody/event'
import type { Database } from '../database/database'
import { eventLine, recordedEvent, SELECT_EVENT_LINES } from './logRow'

/** What is folded in one go at most. */
const CYLINDERS_AT_ONCE = 200
const EVENTS_AT_ONCE = 1_000

/** The next cylinders of the log in the order of their ids; `last` is null where none follow. */
export async function cylindersAfter(db: Database, after: string): Promise<{ ids: string[], last: string | null }> {
  const { rows } = await db.readClient.execute({
    sql: 'SELECT cylinder_id, count(*) FROM custody_events WHERE cylinder_id > ? GROUP BY cylinder_id ORDER BY cylinder_id LIMIT ?',
    args: [after, CYLINDERS_AT_ONCE],
  })
  let events = 0
  const tooMany = rows.findIndex(row => (events += row[1] as number) > EVENTS_AT_ONCE)
  const ids = rows.slice(0, tooMany === -1 ? rows.length : Math.max(1, tooMany)).map(row => row[0] as string)
  return { ids, last: ids.length < rows.length || rows.length === CYLINDERS_AT_ONCE ? ids.at(-1)! : null }
}

/** The events of these cylinders, each cylinder's in the order of recording. */
export async function logsOf(db: Database, ids: readonly string[]): Promise<Map<string, AnyRecordedEvent[]>> {
  const logs = new Map<string, AnyRecordedEvent[]>()
  if (ids.length === 0) return logs
  const { rows } = await db.readClient.execute({
    sql: `${SELECT_EVENT_LINES} WHERE cylinder_id IN (${ids.map(() => '?').join(', ')}) ORDER BY cylinder_id, version`, args: [...ids],
  })
  for (const event of rows.map(row => recordedEvent(eventLine(row)))) {
    const log = logs.get(event.cylinderId)
    if (log) log.push(event)
    else logs.set(event.cylinderId, [event])
  }
  return logs
}
