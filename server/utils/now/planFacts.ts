import type { NowFacts } from '../../../utils/now/nowFacts'
import type { Database } from '../database/database'
import { followPlans } from '../plan/followPlans'

/** The steps that open plans of what to bring together have left. */
export async function planFacts(db: Database, nowMs: number): Promise<NowFacts['plansOpen']> {
  await followPlans(db, nowMs)
  const { rows: [row] } = await db.readClient.execute(
    `SELECT p.id, p.number, count(*) OVER (), sum(count(*)) OVER () FROM plans p JOIN plan_tasks t ON t.plan_id = p.id AND t.done_event_id IS NULL
      WHERE p.state = 'open' AND p.kind = 'consolidation' GROUP BY p.id ORDER BY p.number LIMIT 1`,
  )
  return row && { id: row[0] as string, number: row[1] as number, plans: row[2] as number, steps: row[3] as number }
}
