import { v7 as uuid } from 'uuid'
import { scales } from '../../../drizzle/schema'
import type { NewScale, ScaleLine } from '../../../utils/contract/scales'
import { stepGrams } from '../../../utils/quantity/scale'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { refuseTakenName } from '../directory/takenName'
import { problem } from '../http/problem'
import { refuseCheckToCome } from './refuseCheckToCome'
import { scaleById } from './scales'

/**
 * A new scale. The same scale sent again is answered as it stands.
 *
 * Errors: 409 for a name that is taken, and where another scale has this id; 422 for a check that is still to come.
 */
export async function createScale(db: Database, body: NewScale, now: number): Promise<ScaleLine> {
  const { id = uuid(), name, accuracy, accuracyPercent, lastCheckOn } = body
  // The name that is free now must still be free when it is written.
  await db.exclusive(async (commit) => {
    const from = await directory(db, true)
    const known = from.scales.get(id)
    if (known) {
      if (known.name === name && known.accuracyGrams === stepGrams(accuracy) && known.accuracyPercent === accuracyPercent) return
      throw problem(409, 'Another scale has this id', 'Send it again under a new id.')
    }
    refuseTakenName(from.scales.values(), { id, name })
    refuseCheckToCome(lastCheckOn, from.timeZone, now)
    await commit([statement(db.read.insert(scales).values({
      id, name, accuracyEntered: accuracy, accuracyGrams: stepGrams(accuracy), accuracyBasisPoints: Math.round(accuracyPercent * 100), lastCheckOn,
    }))])
  })
  await directory(db, true)
  return (await scaleById(db, id))!
}
