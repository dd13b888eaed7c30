import type { Database } from '../database/database'
import { checkpointNow } from './checkpointNow'
import { newestCheckpoint } from './checkpoints'

const DAY_MS = 86_400_000
/** How often it is looked whether one is due: a server that slept or was down makes the missing one soon after. */
const LOOK_EVERY_MS = 10 * 60_000

/** Whether a day has gone by since the newest checkpoint. An empty log has nothing to sign. */
export async function isCheckpointDue(db: Database, now: number): Promise<boolean> {
  const newest = await newestCheckpoint(db)
  if (newest?.says && now - newest.says.at < DAY_MS) return false
  const { rows } = await db.readClient.execute('SELECT 1 FROM custody_events LIMIT 1')
  return rows.length > 0
}

/** Makes a checkpoint each day for as long as the process lives, the first at once where it is due; answers how to end it. */
export function keepCheckpointing(db: Database): () => void {
  let timer: NodeJS.Timeout | undefined
  let hasEnded = false
  async function turn(): Promise<void> {
    try {
      if (await isCheckpointDue(db, Date.now())) await checkpointNow(db, Date.now(), null)
    }
    catch (error) {
      console.error('The daily checkpoint of the log could not be made; it is tried again in ten minutes:', String(error))
    }
    if (hasEnded) return
    timer = setTimeout(() => void turn(), LOOK_EVERY_MS)
    timer.unref()
  }
  void turn()
  return () => {
    hasEnded = true
    clearTimeout(timer)
  }
}
