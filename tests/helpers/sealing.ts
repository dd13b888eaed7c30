import type { Database } from '../../server/utils/database/database'
import { sealing, type Sealing } from '../../server/utils/proof/sealing'

/** The secret of TEST 1 of RFC 8032, section 7.1, in base64. */
export const TEST_KEY = 'nWGxne/9WmC6hEr0kuwsxERJxXN7MmkZcDusAxyuf2A='

/** What signs the checkpoints of a test's log; copies go beside its file. */
export async function testSealing(db: Database, formerCheckpointKeys: string[] = []): Promise<Sealing> {
  const made = await sealing(db, { checkpointKey: TEST_KEY, formerCheckpointKeys })
  if (!made) throw new Error('There is no firm')
  return made
}
