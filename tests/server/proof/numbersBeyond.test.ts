import { describe, expect, it } from 'vitest'
import { makeCheckpoint } from '../../../server/utils/proof/checkpoints'
import { verifyLog } from '../../../server/utils/proof/verifyLog'
import { newCylinder, openLogDatabase } from '../../helpers/logDatabase'
import { testSealing } from '../../helpers/sealing'
import { dropGuards } from '../../helpers/tampering'

const NOW = Date.parse('2026-07-01T17:00:00Z')

describe('a number in the log that is beyond all that were given', () => {
  // 2^53 + 1: the driver hands out no such number.
  it.each(['seq', 'version', 'effective_at', 'recorded_at'])('is found where it stands in %s, by verifying all and since a checkpoint', async (column) => {
    const log = await openLogDatabase()
    const sealing = await testSealing(log.db)
    await newCylinder(log)
    await makeCheckpoint(log.db, sealing, NOW, null)
    await newCylinder(log)
    await dropGuards(log.db)
    await log.db.write([{ sql: `UPDATE custody_events SET ${column} = ? WHERE seq = (SELECT max(seq) FROM custody_events)`, args: [9_007_199_254_740_993n] }])
    for (const since of [null, 1]) {
      const verdict = await verifyLog(log.db, { now: NOW, sealing, since })
      expect(verdict.ok).toBe(false)
      expect(verdict.damage.map(({ kind }) => kind)).toContain('unreadable')
    }
    log.close()
  })
})
