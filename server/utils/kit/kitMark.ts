import type { Database } from '../database/database'
import { cacheShape } from '../custody/cacheShape'
import { sha256 } from '../custody/sha256'

/**
 * Names the custody log up to one of its lines, and what cached states mean.
 *
 * A phone that goes on from there has another mark where the database is another one, a restored one that has gone on
 * differently, or where states are made in another way: then it must begin anew.
 *
 * @returns null where the log has no such line; the beginning, 0, has none and is always there.
 */
export async function kitMark(db: Database, seq: number): Promise<string | null> {
  const { rows } = await db.readClient.execute({ sql: 'SELECT hash FROM custody_events WHERE seq = ?', args: [seq] })
  const hash = rows[0]?.[0] as string | undefined
  return seq > 0 && hash === undefined ? null : sha256(`${cacheShape()} ${hash ?? ''}`).slice(0, 16)
}
