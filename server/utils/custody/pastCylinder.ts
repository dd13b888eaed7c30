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
    // Whom its own halves named then, and who names it or wears its labels: their logs say what this one's does not.
    const { rows } = await db.readClient.execute({
      sql: `SELECT other_id FROM halves WHERE cylinder_id = ?1 UNION SELECT cylinder_id FROM halves WHERE other_id = ?1
        UNION SELECT b.cylinder_id FROM label_claims a JOIN label_claims b ON a.code = b.code WHERE a.cylinder_id = ?1`,
      args: [id],
    })
    const named = await own.db.readClient.execute('SELECT other_id FROM halves')
    await fillPast(db, own, past, [...new Set([...rows, ...named.rows].map(row => row[0] as string))].filter(other => other !== id))
    const view = await cylinderView(own.db, id, { access: null, nowMs: own.atMs, askedRefrigerant })
    if (!view) throw notYetThere()
    return view
  }
  finally {
    own.remove()
  }
}

/** A cylinder of which the log had nothing at a past instant. */
export function notYetThere() {
  return problem(404, 'Not there yet', 'Nothing of this cylinder had happened, or was known, at that time.')
}
