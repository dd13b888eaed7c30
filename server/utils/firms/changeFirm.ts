import { eq } from 'drizzle-orm'
import { firms, places } from '~~/drizzle/schema'
import type { Firm, FirmChange } from '~~/utils/contract/places'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { refuseTakenName } from '../directory/takenName'
import { problem } from '../http/problem'
import { refuseStrayRin } from './createFirm'
import { firmById } from './firms'

/**
 * Changes a firm; its place keeps the same name and is turned off and on with it.
 *
 * Errors: 404; 409 for turning off a firm where cylinders stand, and for a name that is taken; 422 for a RIN on a firm that is no requalifier.
 */
export async function changeFirm(db: Database, id: string, change: FirmChange): Promise<Firm> {
  // What is checked here must still hold when it is written.
  await db.exclusive(async (commit) => {
    const firm = await firmById(db, id)
    if (!firm) throw problem(404, 'No such firm', 'It may have been written wrongly.')
    if (change.active === false && firm.active && firm.cylinders > 0) {
      throw problem(409, 'Cylinders stand there', `Bring the ${firm.cylinders} back first; then it can be turned off.`)
    }
    refuseStrayRin(firm.kind, change.rin ?? null)
    if (change.name !== undefined && change.name !== firm.name) refuseTakenName((await directory(db, true)).firms.values(), { id, name: change.name })
    const { name = firm.name, active = firm.active } = change
    await commit([
      statement(db.read.update(firms).set({ ...change, name, active }).where(eq(firms.id, id))),
      statement(db.read.update(places).set({ name, active }).where(eq(places.firmId, id))),
    ])
  })
  await directory(db, true)
  return (await firmById(db, id))!
}
