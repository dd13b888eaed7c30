import type { Database } from '../database/database'
import type { FleetFilter } from './fleetFilter'

interface Kept { writes: number, at: number, totals: Map<string, number> }

/** Another process on the same database server may have written: how long a count may lag. */
const LONGEST_AGE_MS = 2_000
const MOST_KEPT = 200

const known = new WeakMap<Database, Kept>()

/** How many cylinders a filter lets through. Counted once until something is written, for two seconds at most. */
export async function fleetTotal(db: Database, filter: FleetFilter): Promise<number> {
  const kept = keptNow(db)
  const key = JSON.stringify([filter.sql, filter.args])
  const total = kept.totals.get(key) ?? await count(db, filter)
  if (kept.totals.size < MOST_KEPT) kept.totals.set(key, total)
  return total
}

function keptNow(db: Database): Kept {
  const kept = known.get(db)
  const now = Date.now()
  if (kept && kept.writes === db.writes() && now - kept.at < LONGEST_AGE_MS) return kept
  const fresh = { writes: db.writes(), at: now, totals: new Map<string, number>() }
  known.set(db, fresh)
  return fresh
}

async function count(db: Database, filter: FleetFilter): Promise<number> {
  const result = await db.readClient.execute({ sql: `SELECT count(*) FROM cylinders c WHERE ${filter.sql}`, args: filter.args })
  return result.rows[0]?.[0] as number
}
