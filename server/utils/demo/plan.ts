import type { Database } from '../database/database'
import { makePlan } from '../plan/makePlan'
import { HOUR } from './calendar'
import { demoAccess, type Cast } from './cast'
import { seededRandom } from './random'

const SEED = 20_261_220

/** A plan of this morning that nobody has begun: which R-22 to bring together in the first shop. */
export async function planTogether(db: Database, { people, shops }: Cast, now: number): Promise<void> {
  const { uuid } = seededRandom(SEED)
  const question = { kind: 'consolidation', id: uuid(now), placeId: shops[0].id, refrigerant: 'R-22', useEmpty: false, worseTogether: false } as const
  await makePlan(db, question, demoAccess(people.warehouse), now - 3 * HOUR)
}
