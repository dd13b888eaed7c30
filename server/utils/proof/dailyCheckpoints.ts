import { MS_PER_DAY } from '../../../utils/quantity/instant'
import type { Database } from '../database/database'
import { Problem } from '../http/problem'
import { checkpointNow } from './checkpointNow'
import { newestCheckpoint } from './checkpoints'
import { sealing, type SealingSettings } from './sealing'

/** How often it is looked whether one is due: a server that slept or was down makes the missing one soon after. */
const LOOK_EVERY_MS = 10 * 60_000

/** Whether a day has gone by since the newest checkpoint. An empty log has nothing to sign. */
export async function isCheckpointDue(db: Database, now: number): Promise<boolean> {
  const newest = await newestCheckpoint(db)
  if (newest?.says && now - newest.says.at < MS_PER_DAY) return false
  const { rows } = await db.readClient.execute('SELECT 1 FROM custody_events LIMIT 1')
  return rows.length > 0
}

/** Says at the start what keeps the log from being signed, not only on the day on which a checkpoint is due. */
export async function tellWhetherSigned(db: Database, settings?: SealingSettings): Promise<void> {
  try {
    await sealing(db, settings)
  }
  catch (error) {
    console.error('The log cannot be signed:', error instanceof Problem ? error.details.detail : String(error))
  }
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
  void tellWhetherSigned(db).then(() => hasEnded ? undefined : turn())
  return () => {
    hasEnded = true
    clearTimeout(timer)
  }
}
