import type { InStatement } from '@libsql/client'
import type { Database } from '../database/database'
import { NEXT_CACHE_TURN } from './cacheTurn'
import { refreshedRows } from './refreshedRows'

/**
 * The rows of every cylinder that shares a code with one of these, as they must read once a label was stuck on or taken
 * back: one code on two cylinders shows on both.
 */
export async function sharedCodeRows(db: Database, cylinderIds: readonly string[], nowMs: number): Promise<InStatement[]> {
  const others = await db.readClient.execute({
    sql: `SELECT DISTINCT other.cylinder_id FROM label_claims mine JOIN label_claims other ON other.code = mine.code
      WHERE mine.cylinder_id IN (${cylinderIds.map(() => '?').join(', ')})
      UNION SELECT id FROM cylinders WHERE finding_codes LIKE '% code-on-two %'`,
    args: [...cylinderIds],
  })
  const rows = await refreshedRows(db, others.rows.map(row => row[0] as string), nowMs)
  return rows.length > 0 ? [NEXT_CACHE_TURN, ...rows] : []
}
