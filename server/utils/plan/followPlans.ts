import type { InStatement } from '@libsql/client'
import type { Database } from '../database/database'

/** A transfer ticks its step off once the pair was recorded after the plan was made, and as long as no correction takes it out. */
const TRANSFERS = `SELECT t.plan_id, t.position, e.id, e.effective_at, e.seq FROM plans p
  JOIN plan_tasks t ON t.plan_id = p.id AND t.kind = 'transfer'
  JOIN cylinders c ON c.id = t.from_cylinder_id
  JOIN json_each(c.state, '$.halves') h
  JOIN custody_events e ON e.id = json_extract(h.value, '$.eventId') AND e.recorded_at >= p.made_at
  WHERE p.state = 'open' AND json_extract(h.value, '$.kind') = 'transferred' AND json_extract(h.value, '$.direction') = 'out'
    AND json_extract(h.value, '$.otherId') = t.to_cylinder_id`

/** A cylinder to be shipped ticks its step off once it has left on a shipment, and as long as the books have it so. */
const SHIPMENTS = `SELECT t.plan_id, t.position, e.id, e.effective_at, e.seq FROM plans p
  JOIN plan_tasks t ON t.plan_id = p.id AND t.kind = 'ship'
  JOIN custody_events e ON e.cylinder_id = t.from_cylinder_id AND e.kind = 'sent-for-reclaim' AND e.recorded_at >= p.made_at
  JOIN shipments s ON s.id = json_extract(e.body, '$.details.shipmentId') AND s.dispatched_at IS NOT NULL AND s.state <> 'cancelled'
  WHERE p.state = 'open' AND EXISTS (SELECT 1 FROM movements m WHERE m.cylinder_id = e.cylinder_id AND m.event_id = e.id AND m.cause = 'shipped')`

/**
 * Ticks off what the log says was done of the open plans, takes a tick back whose event was taken out, and ends the plans
 * of which nothing is left. What stands already is not written again.
 */
export async function followPlans(db: Database, nowMs: number): Promise<void> {
  const [transfers, shipments, stored] = await db.readClient.batch([
    `${TRANSFERS} ORDER BY e.seq`, `${SHIPMENTS} ORDER BY e.seq`,
    `SELECT t.plan_id, t.position, t.done_event_id FROM plan_tasks t JOIN plans p ON p.id = t.plan_id WHERE p.state = 'open'`,
  ], 'read')
  const done = new Map<string, { eventId: string, at: number }>()
  for (const row of [...transfers!.rows, ...shipments!.rows]) {
    const key = `${row[0] as string} ${row[1] as number}`
    if (!done.has(key)) done.set(key, { eventId: row[2] as string, at: row[3] as number })
  }
  const changed = stored!.rows.flatMap((row): InStatement[] => {
    const now = done.get(`${row[0] as string} ${row[1] as number}`)
    if ((now?.eventId ?? null) === row[2]) return []
    return [{
      sql: `UPDATE plan_tasks SET done_event_id = ?, done_at = ? WHERE plan_id = ? AND position = ? AND EXISTS (SELECT 1 FROM plans WHERE id = plan_id AND state = 'open')`,
      args: [now?.eventId ?? null, now?.at ?? null, row[0] as string, row[1] as number],
    }]
  })
  if (changed.length === 0) return
  await db.write([...changed, {
    sql: `UPDATE plans SET state = 'done', ended_at = ? WHERE state = 'open' AND NOT EXISTS (SELECT 1 FROM plan_tasks t WHERE t.plan_id = plans.id AND t.done_event_id IS NULL)`,
    args: [nowMs],
  }])
}
