import type { InStatement } from '@libsql/client'
import type { ActBy, ActKind, ShipmentAct } from '~~/utils/shipment/acts'
import { instantText } from '../cylinder-lists/paging'
import type { Guard } from '../custody/posting'
import type { Database } from '../database/database'
import { problem } from '../http/problem'

/** Something done to a shipment that is about to be kept. Units: instants in UTC milliseconds. */
export interface NewAct {
  /** The sender's; the same id sent again is the same act. */
  id: string
  shipmentId: string
  kind: ActKind
  cylinderId?: string | null
  details?: Record<string, unknown>
  by: ActBy
  /** As the device claimed, and not after it was recorded. */
  occurredAt: number
  recordedAt: number
}

/** When something was done, as its device claimed: a clock that runs ahead does not put it after it was recorded. Units: UTC milliseconds. */
export function claimedAt(occurredAt: string, now: number): number {
  return Math.min(Date.parse(occurredAt), now)
}

const ALWAYS: Guard = { sql: '1', args: [] }

/** Keeps an act where a condition holds; it answers a row only where the act is new. */
export function actStatement(act: NewAct, where: Guard = ALWAYS): InStatement {
  const [personId, linkId, linkName] = 'personId' in act.by ? [act.by.personId, null, null] : [null, act.by.linkId, act.by.linkName]
  return {
    sql: `INSERT INTO shipment_acts (id, shipment_id, kind, cylinder_id, details, person_id, link_id, link_name, occurred_at, recorded_at)
      SELECT ?, ?, ?, ?, ?, ?, ?, ?, ?, ? WHERE ${where.sql} ON CONFLICT DO NOTHING RETURNING id`,
    args: [
      act.id, act.shipmentId, act.kind, act.cylinderId ?? null, JSON.stringify(act.details ?? {}), personId, linkId, linkName, act.occurredAt, act.recordedAt,
      ...where.args,
    ],
  }
}

/** Holds for the statements of a commit in which an act was kept for the first time. */
export function isKeptNow({ id, recordedAt }: Pick<NewAct, 'id' | 'recordedAt'>): Guard {
  return { sql: 'EXISTS (SELECT 1 FROM shipment_acts WHERE id = ? AND recorded_at = ?)', args: [id, recordedAt] }
}

/** Whether an act was kept already: the same request was sent before. Errors: 409 where the id is another act's. */
export async function isKept(db: Database, { id, shipmentId, kind, cylinderId }: NewAct): Promise<boolean> {
  const { rows } = await db.readClient.execute({ sql: 'SELECT shipment_id, kind, cylinder_id FROM shipment_acts WHERE id = ?', args: [id] })
  const row = rows[0]
  if (!row) return false
  if (row[0] === shipmentId && row[1] === kind && (row[2] ?? null) === (cylinderId ?? null)) return true
  throw problem(409, 'Something else was done under this id', 'Send it again under a new id.')
}

/** What was done to a shipment, in the order it was recorded. */
export async function actsOf(db: Database, shipmentId: string): Promise<ShipmentAct[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT act.id, act.kind, act.cylinder_id, cylinders.label_code, cylinders.serial, act.details, coalesce(act.link_name, people.name) AS by_name, act.link_id, act.occurred_at, act.recorded_at
      FROM shipment_acts AS act LEFT JOIN people ON people.id = act.person_id LEFT JOIN cylinders ON cylinders.id = act.cylinder_id
      WHERE act.shipment_id = ? ORDER BY act.seq`,
    args: [shipmentId],
  })
  return rows.map(row => ({
    id: row['id'] as string,
    kind: row['kind'] as ActKind,
    cylinderId: row['cylinder_id'] as string | null,
    cylinder: row['cylinder_id'] === null ? null : { id: row['cylinder_id'] as string, labelCode: row['label_code'] as string | null, serial: row['serial'] as string | null },
    details: JSON.parse(row['details'] as string) as Record<string, unknown>,
    by: row['by_name'] as string | null,
    isTheirs: row['link_id'] !== null,
    occurredAt: instantText(row['occurred_at'])!,
    recordedAt: instantText(row['recorded_at'])!,
  }))
}
