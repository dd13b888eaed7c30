import type { CylinderView } from '../../../utils/custody/cylinderView'
import type { Past } from '../../../utils/custody/asItStood'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { cylinderView } from './cylinderViews'
import { fillPast, openPastDatabase } from './pastDatabase'

/**
 * One cylinder as it stood, or as it was known, by the rules and on the day of that instant. It offers no acts.
 *
 * Errors: 404 where nothing had happened to it by then.
 */
export async function pastCylinder(db: Database, id: string, past: Past, askedRefrigerant?: string): Promise<CylinderView> {
  const own = await openPastDatabase(db, past)
  try {
    await fillPast(db, own, past, [id])
    await fillPast(db, own, past, await othersThen(db, own.db, id))
    const view = await cylinderView(own.db, id, { access: null, nowMs: own.atMs, askedRefrigerant })
    if (!view) throw notYetThere()
    return view
  }
  finally {
    own.remove()
  }
}

/**
 * Other cylinders whose logs said what this one's does not: whom its halves named then, and who wore its labels, also by
 * what was corrected since.
 *
 * @param past holds this cylinder as it was then.
 */
async function othersThen(db: Database, past: Database, id: string): Promise<string[]> {
  const [named, claimed] = await past.readClient.batch(['SELECT other_id FROM halves', 'SELECT DISTINCT code FROM label_claims'], 'read')
  const { rows } = await db.readClient.execute({
    sql: `SELECT cylinder_id FROM label_claims WHERE code IN (SELECT value FROM json_each(?1))
      UNION SELECT cylinder_id FROM (
        SELECT c.cylinder_id, e.body ->> '$.details.code' AS code FROM custody_events c
          JOIN custody_events e ON e.id = c.body ->> '$.details.eventId' WHERE c.kind = 'corrected'
        UNION ALL SELECT cylinder_id, body ->> '$.details.instead.code' FROM custody_events WHERE kind = 'corrected'
      ) WHERE code IN (SELECT value FROM json_each(?1))`,
    args: [JSON.stringify(claimed!.rows.map(row => row[0]))],
  })
  return [...new Set([...rows, ...named!.rows].map(row => row[0] as string))].filter(other => other !== id)
}

/** A cylinder of which the log had nothing at a past instant. */
export function notYetThere() {
  return problem(404, 'Not there yet', 'Nothing of this cylinder had happened, or was known, at that time.')
}
