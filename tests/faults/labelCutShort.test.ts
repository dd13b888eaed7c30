import { afterAll, beforeAll, expect, it } from 'vitest'
import { rebuildCaches } from '../../server/utils/custody/rebuild'
import type { Database } from '../../server/utils/database/database'
import { StorageUnavailable } from '../../server/utils/database/storageFailure'
import { drawLabelCode } from '../../utils/label/code'
import { cacheLines } from '../helpers/caches'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../helpers/logDatabase'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

/** The database as a process has it whose storage fails after so many commits. */
function failingAfter(commits: number): Database {
  let left = commits
  return {
    ...log.db,
    exclusive: work => log.db.exclusive(commit => work(async (statements) => {
      if (left-- > 0) return commit(statements)
      throw new StorageUnavailable('database or disk is full')
    })),
  }
}

it('shows one code on both cylinders of the fleet, also where the server ended between the label and the other cylinder\'s row', async () => {
  const [first, second] = [await newCylinder(log), await newCylinder(log)]
  const code = drawLabelCode(count => crypto.getRandomValues(new Uint8Array(count)))
  await record(log.db, log.warehouse, [sent(first, 'labelled', { code })])
  const label = sent(second, 'labelled', { code })
  await expect(record(failingAfter(1), log.warehouse, [label])).rejects.toBeInstanceOf(StorageUnavailable)
  // It was never answered, so the phone sends it again.
  expect(await record(log.db, log.warehouse, [label])).toMatchObject([{ outcome: 'duplicate' }])
  const live = await cacheLines(log.db)
  expect(live.filter(line => line.startsWith('cylinders') && line.includes(' code-on-two '))).toHaveLength(2)
  await rebuildCaches(log.db, Date.now())
  expect(await cacheLines(log.db)).toEqual(live)
})
