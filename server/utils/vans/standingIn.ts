import type { CylinderRow } from '../../../utils/contract/custody'
import { cylinderRowsWhere } from '../custody/fleet'
import type { Database } from '../database/database'

/** Every cylinder that stands in a van: its load is the sum of them all, and a check-in looks for each. */
export function standingIn(db: Database, vanId: string, nowMs: number): Promise<CylinderRow[]> {
  return cylinderRowsWhere(db, { sql: 'c.place_id = ?', args: [vanId] }, null, nowMs)
}
