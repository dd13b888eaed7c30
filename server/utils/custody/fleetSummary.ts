import type { InStatement } from '@libsql/client'
import type { FleetSummary } from '../../../utils/contract/custody'
import { addMonths } from '../../../utils/quantity/month'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { dateBounds } from './dateBounds'
import { findingFilter, IN_FLEET, type FleetFilter } from './fleetFilter'

const IN_USE = `c.lifecycle NOT IN ('condemned', 'retired')`

/** The counts beside the fleet's filters, and what falls due when. */
export async function fleetSummary(db: Database, nowMs: number): Promise<FleetSummary> {
  const from = await directory(db)
  const bounds = dateBounds(from, nowMs)
  const late = findingFilter('retest-overdue', bounds)
  const lastMonth = addMonths(bounds.thisMonth, 11)
  const [counts, full, due, refrigerants, lateRows] = await db.readClient.batch([
    countsOf([
      { sql: IN_USE, args: [] }, findingFilter('stop', bounds), findingFilter('caution', bounds), findingFilter('not-seen', bounds),
    ]),
    `SELECT count(*) FROM cylinders c
      WHERE c.finding_codes LIKE '% nearly-full %' AND c.finding_codes NOT LIKE '% overfill %' AND c.lifecycle = 'in-service' AND ${IN_FLEET}`,
    {
      sql: `SELECT c.due_month, count(*) FROM cylinders c WHERE c.retest_state = 'dated' AND c.due_month >= ? AND c.due_month <= ? AND ${IN_USE} AND ${IN_FLEET} GROUP BY c.due_month`,
      args: [bounds.thisMonth, lastMonth],
    },
    // As many as the filter of the list then finds: those away and ended too.
    `SELECT c.refrigerant, count(*) FROM cylinders c WHERE c.refrigerant IS NOT NULL AND ${IN_FLEET} GROUP BY c.refrigerant ORDER BY count(*) DESC, c.refrigerant`,
    { sql: `SELECT count(*) FROM cylinders c WHERE (${late.sql}) AND ${IN_FLEET}`, args: late.args },
  ], 'read')
  const number = (index: number) => (counts?.rows[0]?.[index] as number | null) ?? 0
  const byMonth = new Map((due?.rows ?? []).map(row => [row[0] as string, row[1] as number]))
  return {
    total: number(0),
    stop: number(1),
    caution: number(2),
    full: { count: full?.rows[0]?.[0] as number },
    notSeen: { count: number(3) },
    late: lateRows?.rows[0]?.[0] as number,
    dueByMonth: Array.from({ length: 12 }, (_, index) => {
      const month = addMonths(bounds.thisMonth, index)
      return { month, count: byMonth.get(month) ?? 0 }
    }),
    refrigerants: (refrigerants?.rows ?? []).map(row => ({ refrigerant: row[0] as string, count: row[1] as number })),
  }
}

function countsOf(filters: FleetFilter[]): InStatement {
  return {
    sql: `SELECT ${filters.map(one => `sum(CASE WHEN ${one.sql} THEN 1 ELSE 0 END)`).join(', ')} FROM cylinders c WHERE ${IN_FLEET}`,
    args: filters.flatMap(one => one.args),
  }
}
