import type { LateFacts } from '../../../utils/now/nowFacts'
import { laterLines } from '../../../utils/custody/laterLines'
import { MS_PER_DAY } from '../../../utils/quantity/instant'
import { foldContext } from '../custody/foldContext'
import { logsOf } from '../custody/logPages'
import type { Database } from '../database/database'
import type { Directory } from '../directory/directory'

const WEEK_MS = 7 * MS_PER_DAY
/** Beyond these the line says no more than that there are many. */
const MOST_CYLINDERS = 50

/** What was recorded this week, came late or mended another line, and changed what lines recorded before it say; the newest first. */
export async function lateFacts(db: Database, from: Directory, nowMs: number): Promise<LateFacts> {
  const { rows } = await db.readClient.execute({
    // Numbers follow the order of recording, so what came since is read from the end.
    sql: `SELECT e.id, e.cylinder_id, c.label_code, c.serial FROM custody_events e JOIN cylinders c ON c.id = e.cylinder_id
      WHERE e.seq > coalesce((SELECT seq FROM custody_events WHERE recorded_at <= ? ORDER BY seq DESC LIMIT 1), 0)
        AND (e.kind = 'corrected' OR e.kind <> 'countersigned' AND EXISTS (SELECT 1 FROM custody_events o
          WHERE o.cylinder_id = e.cylinder_id AND o.version < e.version AND (e.kind = 'registered' OR o.effective_at >= e.effective_at)))
      ORDER BY e.seq DESC`,
    args: [nowMs - WEEK_MS],
  })
  const cylinders = [...new Set(rows.map(row => row[1] as string))].slice(0, MOST_CYLINDERS)
  const logs = await logsOf(db, cylinders)
  const asked = new Set(rows.map(row => row[0] as string))
  const changing = new Map([...logs.values()].flatMap(events => [...laterLines(events, foldContext(from), asked)]))
  const found = rows.filter(row => changing.has(row[0] as string))
  return {
    count: found.length,
    lines: found.reduce((sum, row) => sum + changing.get(row[0] as string)!.length, 0),
    cylinders: [...new Map(found.map(row => [row[1] as string, { id: row[1] as string, labelCode: row[2] as string | null, serial: row[3] as string | null }])).values()],
  }
}
