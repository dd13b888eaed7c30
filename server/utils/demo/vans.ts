import type { InStatement } from '@libsql/client'
import { vanCheckIns, vanMaterials } from '../../../drizzle/schema'
import { statement, type Database } from '../database/database'
import { DAY, HOUR, workingMorning } from './calendar'
import type { Cast } from './cast'
import { seededRandom } from './random'

const SEED = 20_261_207
/** Whoever checked the van in had not seen these for so long. */
const UNSEEN_DAYS = 30

/**
 * What two vans carry beside cylinders, and the return of a third, which lacked what nobody has seen for weeks.
 *
 * Asked once the history is recorded: what was aboard is read from it.
 */
export async function vanTables({ read, readClient }: Database, { vans, people }: Cast, now: number): Promise<InStatement[]> {
  // Of their own, so that the story stays as it is whatever vans there are.
  const { uuid } = seededRandom(SEED)
  const returned = vans[2]!
  const saidAt = workingMorning(now - 6 * DAY)
  const checkedAt = workingMorning(now - 3 * DAY) + 6 * HOUR
  const { rows } = await readClient.execute({
    sql: 'SELECT id, last_seen_at < ? FROM cylinders WHERE place_id = ? AND last_seen_at < ? ORDER BY id',
    args: [checkedAt - UNSEEN_DAYS * DAY, returned.id, checkedAt],
  })
  const ids = (isMissing: boolean) => rows.filter(row => (row[1] === 1) === isMissing).map(row => row[0] as string)
  return [
    statement(read.insert(vanMaterials).values({
      id: uuid(saidAt), vanId: vans[0]!.id, gross: { unit: 'lb', value: 86 }, note: 'torch set, one nitrogen, recovery machine', saidBy: people.technician.id, saidAt,
    })),
    statement(read.insert(vanMaterials).values({
      id: uuid(saidAt), vanId: vans[1]!.id, gross: { unit: 'kg', value: 31.5 }, note: 'torch set, paint', saidBy: people.second.id, saidAt,
    })),
    statement(read.insert(vanCheckIns).values({
      id: uuid(checkedAt), vanId: returned.id, found: ids(false), missing: ids(true), checkedBy: people.warehouse.id, checkedAt,
    })),
  ]
}
