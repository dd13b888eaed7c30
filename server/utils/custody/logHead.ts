import type { LogHead } from '../../../utils/contract/log'
import type { Database } from '../database/database'
import { checkpointLine, newestCheckpoint } from '../proof/checkpoints'

/** The last number of the custody log, how many events it holds, and its newest checkpoint. */
export async function logHead(db: Database): Promise<LogHead> {
  const [{ rows }, newest] = await Promise.all([
    db.readClient.execute('SELECT coalesce(max(seq), 0), count(*) FROM custody_events'), newestCheckpoint(db),
  ])
  return { seq: rows[0]?.[0] as number, events: rows[0]?.[1] as number, checkpoint: newest && await checkpointLine(db, newest) }
}
