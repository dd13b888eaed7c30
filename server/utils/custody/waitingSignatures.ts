import type { CountersigningAnswer, WaitingEntry } from '../../../utils/contract/countersigning'
import type { Database } from '../database/database'
import { foreignCursor } from '../http/cursor'
import { custodyLog } from './custodyLog'

/** More lines than a cylinder ever has: its whole log. */
const WHOLE_LOG = Number.MAX_SAFE_INTEGER

/**
 * What trainees recorded under a supervisor that waits for that person's signature, the first recorded first; of one
 * cylinder where its id is given. Errors: 400 for a cursor that is none of ours.
 */
export async function waitingSignatures(
  db: Database, supervisorId: string, { cylinderId, limit, cursor }: { cylinderId?: string, limit: number, cursor?: string },
): Promise<CountersigningAnswer> {
  if (cursor !== undefined && !/^[1-9]\d{0,14}$/.test(cursor)) throw foreignCursor()
  const cylinders = await cylindersWaiting(db, supervisorId, cylinderId)
  const logs = await Promise.all(cylinders.map(id => custodyLog(db, id, { limit: WHOLE_LOG })))
  const waiting = logs.flatMap(({ items, cylinder: { id, labelCode, serial } }) => items
    .filter(line => line.signature?.by === null && line.supervisor?.id === supervisorId && line.author.id !== supervisorId)
    .map((line): WaitingEntry => ({ cylinder: { id, labelCode, serial }, line })))
    .sort((a, b) => a.line.seq - b.line.seq)
  const rest = waiting.filter(({ line }) => line.seq > Number(cursor ?? 0))
  const items = rest.slice(0, limit)
  return { items, nextCursor: rest.length > limit ? String(items.at(-1)!.line.seq) : null, total: waiting.length }
}

// No cylinder that waits is left out. One in which something was corrected, a signature maybe, may wait again: the fold tells.
async function cylindersWaiting(db: Database, supervisorId: string, cylinderId?: string): Promise<string[]> {
  const { rows } = await db.readClient.execute({
    sql: `SELECT DISTINCT e.cylinder_id FROM custody_events e
      WHERE e.trainee = 1 AND e.supervisor_id = ? AND (? IS NULL OR e.cylinder_id = ?)
        AND (NOT EXISTS (SELECT 1 FROM custody_events s WHERE s.cylinder_id = e.cylinder_id AND s.kind = 'countersigned'
            AND s.actor_id = e.supervisor_id AND json_extract(s.body, '$.details.eventId') = e.id)
          OR EXISTS (SELECT 1 FROM custody_events s WHERE s.cylinder_id = e.cylinder_id AND s.kind = 'corrected'))`,
    args: [supervisorId, cylinderId ?? null, cylinderId ?? null],
  })
  return rows.map(row => row[0] as string)
}
