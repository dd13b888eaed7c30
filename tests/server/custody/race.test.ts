import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { groupCaches } from '../../../server/utils/custody/caches'
import { group } from '../../../server/utils/custody/group'
import { parsePost } from '../../../server/utils/custody/judge'
import { insertLogRows, recordedEvent } from '../../../server/utils/custody/logRow'
import { rebuildCaches } from '../../../server/utils/custody/rebuild'
import { sealedRow } from '../../../server/utils/custody/sealedRow'
import { verifyLog } from '../../../server/utils/proof/verifyLog'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

const CACHES = [
  'SELECT * FROM cylinders ORDER BY id', 'SELECT * FROM movements ORDER BY cylinder_id, event_id, ordinal',
  'SELECT * FROM stock_changes ORDER BY cylinder_id, event_id, ordinal', 'SELECT * FROM label_claims ORDER BY event_id', 'SELECT * FROM halves ORDER BY event_id',
]

async function caches(): Promise<string> {
  const results = await log.db.readClient.batch(CACHES, 'read')
  return JSON.stringify(results.map(result => result.rows))
}

describe('two writers on one log', () => {
  it('lets the loser of a race change neither the log nor a cache', async () => {
    const id = await newCylinder(log)
    const losing = parsePost(sent(id, 'filled', { refrigerant: 'R-410A', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(60), looked: true }))
    if (!('event' in losing)) throw new Error('not parsed')
    // The loser has read the log and computed everything; then another process records.
    const read = await group(log.db, [losing.event])
    const row = sealedRow(losing, { events: [], access: log.technician, now: Date.now(), deviceNow: null }, read.headOf(id), read.nextSeq(), null)
    read.add(row, recordedEvent(row))
    const other = await log.openAgain()
    await record(other, log.technician, [sent(id, 'filled', { refrigerant: 'R-22', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(33), looked: true })])
    const before = await caches()
    const answers = await log.db.write([...insertLogRows([row], read), ...(await groupCaches(log.db, read)).statements])
    expect(answers[0]!.rows).toHaveLength(0)
    expect(await caches()).toBe(before)
    expect(await verifyLog(log.db, { now: 0, sealing: null })).toMatchObject({ ok: true })
  })

  it('records everything of both when they post at once, each event once', async () => {
    const ids = await Promise.all([newCylinder(log), newCylinder(log), newCylinder(log)])
    const other = await log.openAgain()
    const posts = Array.from({ length: 60 }, (_, index) => record(index % 2 ? log.db : other, log.technician, [sent(ids[index % 3]!, 'weighed', { gross: lb(27.5 + index / 10) }, { deviceSeq: index })]))
    const outcomes = (await Promise.all(posts)).flat().map(result => result.outcome)
    expect(outcomes).toEqual(Array(60).fill('accepted'))
    expect(await verifyLog(log.db, { now: 0, sealing: null })).toMatchObject({ ok: true })
  })

  it('rebuilds the caches to what they were, byte for byte', async () => {
    const first = await newCylinder(log)
    const second = await newCylinder(log)
    await record(log.db, log.warehouse, [sent(first, 'labelled', { code: '7K3M9Q2TX' }), sent(second, 'labelled', { code: '7K3 M9Q 2TX' })])
    await record(log.db, log.technician, [sent(first, 'weighed', { gross: lb(30) })])
    const live = await caches()
    expect(live).toContain('code-on-two')
    await rebuildCaches(log.db, Date.now())
    expect(await caches()).toBe(live)
  })
})
