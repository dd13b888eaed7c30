import type { LogHead } from '../../../utils/contract/log'
import type { Database } from '../database/database'
import { checkpointLine, newestCheckpoint } from '../proof/checkpoints'
import { logLength } from './logLength'

/** The last number of the custody log, how many events it holds, and its newest checkpoint. */
export async function logHead(db: Database): Promise<LogHead> {
  const [length, newest] = await Promise.all([logLength(db), newestCheckpoint(db)])
  return { ...length, checkpoint: newest && await checkpointLine(db, newest) }
}
