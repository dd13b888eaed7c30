import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { groupCaches } from '../../../server/utils/custody/caches'
import { group } from '../../../server/utils/custody/group'
import { parsePost } from '../../../server/utils/custody/judge'
import { insertLogRows, recordedEvent } from '../../../server/utils/custody/logRow'
import { rebuildCaches } from '../../../server/utils/custody/rebuild'
import { sealedRow } from '../../../server/utils/custody/sealedRow'
import { cacheLines } from '../../helpers/caches'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { lb } from '../../helpers/stamps'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
})
afterAll(() => log.close())

const HOUR = 3_600_000

function weighed(id: string, pounds: number, more: object = {}) {
  return sent(id, 'weighed', { gross: lb(pounds) }, more)
}

function hoursAgo(hours: number) {
  return { occurredAt: new Date(Date.now() - hours * HOUR).toISOString() }
}

/** What the caches hold, once it was seen that the log alone makes the same. */
async function soundCaches(): Promise<string[]> {
  const kept = await cacheLines(log.db)
  await rebuildCaches(log.db, Date.now())
  expect(await cacheLines(log.db)).toEqual(kept)
  return kept
}

/** An event that was read for and judged, but is not written yet. */
async function aboutToWrite(id: string) {
  const post = parsePost(weighed(id, 40))
  if (!('event' in post)) throw new Error('not parsed')
  const read = await group(log.db, [post.event])
  const row = sealedRow(post, { events: [], access: log.technician, now: Date.now(), deviceNow: null }, read.headOf(id), read.nextSeq(), null)
  read.add(row, recordedEvent(row))
  return { write: async () => (await log.db.write([...insertLogRows([row], read), ...(await groupCaches(log.db, read)).statements]))[0]!.rows.length }
}

describe('recording on what is kept of a cylinder', () => {
  it('keeps the caches as the log alone would make them, whether events come in order, late, or mend others', async () => {
    const id = await newCylinder(log)
    const other = await newCylinder(log)
    const filled = sent(id, 'filled', { refrigerant: 'R-410A', condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(40), looked: true })
    const out = { transferId: id, counterpartId: other, refrigerant: 'R-410A', condition: 'clean' }
    await record(log.db, log.warehouse, [sent(id, 'labelled', { code: '7K3M9Q2TX' }), sent(other, 'labelled', { code: '7K3M9Q2TX' })])
    await record(log.db, log.technician, [filled, weighed(id, 41, hoursAgo(5)), weighed(id, 39.5)])
    await record(log.db, log.technician, [
      sent(id, 'transferred', { ...out, direction: 'out', grossAfter: lb(35) }), sent(other, 'transferred', { ...out, counterpartId: id, direction: 'in', grossAfter: lb(31) }),
    ])
    await record(log.db, log.technician, [sent(id, 'corrected', { eventId: filled.id, reason: 'misread', instead: { refrigerant: 'R-410A', grossAfter: lb(41), looked: true } })])
    await record(log.db, log.technician, [weighed(id, 34.5), weighed(other, 30.5)])
    await record(log.db, log.warehouse, [sent(id, 'labelled', { code: '7K3M9Q2TX' })])
    expect((await soundCaches()).length).toBeGreaterThan(0)
  })

  it('takes out what a correction had named before it came', async () => {
    const id = await newCylinder(log)
    const slip = weighed(id, 300)
    await record(log.db, log.manager, [sent(id, 'corrected', { eventId: slip.id, reason: 'another cylinder' }, { expects: 1 })])
    await record(log.db, log.technician, [slip])
    const { rows } = await log.db.readClient.execute({ sql: 'SELECT net_grams FROM cylinders WHERE id = ?', args: [id] })
    expect(rows[0]![0]).toBe(0)
    await soundCaches()
  })

  it.each([
    ['is gone', 'DELETE FROM cylinders WHERE id = ?'],
    ['is behind the log', 'UPDATE cylinders SET version = 1, state = json_set(state, \'$.version\', 1, \'$.contents.netGrams\', 7) WHERE id = ?'],
  ])('begins anew from the log where the row %s', async (_, damage) => {
    const id = await newCylinder(log)
    await record(log.db, log.technician, [weighed(id, 30)])
    await log.db.write([{ sql: damage, args: [id] }])
    await record(log.db, log.technician, [weighed(id, 31)])
    await soundCaches()
  })

  it('writes nothing by a row that another process has made anew since it was read, and then by the new one', async () => {
    const id = await newCylinder(log)
    await log.db.write([{ sql: 'UPDATE cylinders SET severity = 2, state = json_set(state, \'$.placeId\', \'nowhere\') WHERE id = ?', args: [id] }])
    const late = await aboutToWrite(id)
    await rebuildCaches(await log.openAgain(), Date.now())
    const rebuilt = await cacheLines(log.db)
    expect(await late.write()).toBe(0)
    expect(await cacheLines(log.db)).toEqual(rebuilt)
    expect(await (await aboutToWrite(id)).write()).toBe(1)
    await soundCaches()
  })
})
