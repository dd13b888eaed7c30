import { eq } from 'drizzle-orm'
import { scales } from '../../../drizzle/schema'
import type { ScaleChange, ScaleLine } from '../../../utils/contract/scales'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { refuseTakenName } from '../directory/takenName'
import { problem } from '../http/problem'
import { refuseCheckToCome } from './refuseCheckToCome'
import { scaleById } from './scales'

/**
 * Changes a scale's name or last check, turns it off or on. What was weighed on it stays as good as it was.
 *
 * Errors: 404; 409 for a name that is taken; 422 for a check that is still to come.
 */
export async function changeScale(db: Database, id: string, change: ScaleChange, now: number): Promise<ScaleLine> {
  // What is checked here must still hold when it is written.
  await db.exclusive(async (commit) => {
    const from = await directory(db, true)
    if (!from.scales.has(id)) throw problem(404, 'No such scale', 'It may have been written wrongly.')
    if (change.name !== undefined) refuseTakenName(from.scales.values(), { id, name: change.name })
    refuseCheckToCome(change.lastCheckOn, from.timeZone, now)
    await commit([statement(db.read.update(scales).set(change).where(eq(scales.id, id)))])
  })
  await directory(db, true)
  return (await scaleById(db, id))!
}
