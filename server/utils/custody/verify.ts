import type { LogVerification } from '../../../utils/contract/log'
import { verifyStep } from '../../../utils/custody/chain'
import type { Database } from '../database/database'
import { logRow, SELECT_LOG, type LogRow } from './logRow'
import { sha256 } from './sha256'

const PAGE_ROWS = 1_000

/**
 * Computes every chain of the custody log again and compares it with what is stored.
 *
 * It finds a changed byte in any column, a line taken out of the middle, and a line put in. By itself it cannot find
 * a chain whose end was cut off, nor one that was computed anew: that takes a checkpoint kept elsewhere.
 */
export async function verifyLog(db: Database, now: number): Promise<LogVerification> {
  const verifiedAt = new Date(now).toISOString()
  let checked = 0
  let cylinders = 0
  let last: LogRow | null = null
  for (;;) {
    const rows = await pageAfter(db, last)
    if (rows.length === 0) return { ok: true, checked, cylinders, checkpoints: 0, verifiedAt }
    for (const row of rows) {
      const before: LogRow | null = last?.cylinder_id === row.cylinder_id ? last : null
      if (!before) cylinders++
      const because = faultOf(row, before)
      if (because) {
        return { ok: false, checked, cylinders, firstBad: { cylinderId: row.cylinder_id, version: row.version, because }, checkpoints: 0, verifiedAt }
      }
      checked++
      last = row
    }
  }
}

async function pageAfter(db: Database, last: LogRow | null): Promise<LogRow[]> {
  const result = await db.readClient.execute({
    sql: `${SELECT_LOG} ${last ? 'WHERE (cylinder_id, version) > (?, ?)' : ''} ORDER BY cylinder_id, version LIMIT ${PAGE_ROWS}`,
    args: last ? [last.cylinder_id, last.version] : [],
  })
  return result.rows.map(logRow)
}

/** What is wrong with a line, given the line before it in the same cylinder; null when nothing is. */
function faultOf(row: LogRow, before: LogRow | null): string | null {
  if (before && row.seq <= before.seq) return 'it was recorded before the line it follows'
  return verifyStep(row, { version: before?.version ?? 0, hash: before?.hash ?? '' }, sha256)
}
