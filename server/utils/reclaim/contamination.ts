import { contaminationPercent } from '~~/utils/reclaim/contamination'
import { logsOf } from '../custody/logPages'
import type { Database } from '../database/database'

/** How many logs are read in one go. */
const AT_ONCE = 200

/** How much of other refrigerants cylinders hold by their last analysis, by id: percent, or null where none tells. */
export async function contaminationOf(db: Database, ids: readonly string[]): Promise<Map<string, number | null>> {
  const found = new Map<string, number | null>(ids.map(id => [id, null]))
  if (ids.length === 0) return found
  const { rows } = await db.readClient.execute({
    sql: `SELECT asked.value FROM json_each(?) asked
      WHERE EXISTS (SELECT 1 FROM custody_events e WHERE e.cylinder_id = asked.value AND e.kind = 'checked' AND e.body LIKE '%"composition"%')`,
    args: [JSON.stringify(ids)],
  })
  const analysed = rows.map(row => row[0] as string)
  for (let from = 0; from < analysed.length; from += AT_ONCE) {
    const logs = await logsOf(db, analysed.slice(from, from + AT_ONCE))
    for (const [id, events] of logs) found.set(id, contaminationPercent(events))
  }
  return found
}
