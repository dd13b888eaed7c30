import type { LogHead } from '../../../utils/contract/log'
import type { Database } from '../database/database'

/** The last number of the custody log and how many events it holds. */
export async function logHead(db: Database): Promise<LogHead> {
  const result = await db.readClient.execute('SELECT coalesce(max(seq), 0), count(*) FROM custody_events')
  return { seq: result.rows[0]?.[0] as number, events: result.rows[0]?.[1] as number, checkpoint: null }
}
