import { describe, expect, it } from 'vitest'
import { exportedLog } from '../../../server/utils/proof/exportLog'
import { begun } from '../../../server/utils/http/begun'
import { directory } from '../../../server/utils/directory/directory'
import { newCylinder, openLogDatabase } from '../../helpers/logDatabase'
import { testSealing } from '../../helpers/sealing'
import { dropGuards } from '../../helpers/tampering'

async function* pieces(...all: string[]): AsyncGenerator<string> {
  yield* all
}

async function read(lines: AsyncGenerator<string>): Promise<string[]> {
  const all: string[] = []
  for await (const line of lines) all.push(line)
  return all
}

describe('an answer in pieces', () => {
  it('has all of them, in their order, however many there are', async () => {
    for (const all of [[], ['one'], ['one', 'two', 'three']]) expect(await read(await begun(pieces(...all)))).toEqual(all)
  })

  it('is refused before it begins where the log cannot be counted', async () => {
    const log = await openLogDatabase()
    await newCylinder(log)
    const lines = async () => begun(exportedLog(log.db, await testSealing(log.db), await directory(log.db, true), 0))
    expect(await read(await lines())).not.toEqual([])
    await dropGuards(log.db)
    // 2^53 + 1: the driver hands out no such number.
    await log.db.write([{ sql: 'UPDATE custody_events SET seq = ?', args: [9_007_199_254_740_993n] }])
    await expect(lines()).rejects.toThrow(RangeError)
    log.close()
  })
})
