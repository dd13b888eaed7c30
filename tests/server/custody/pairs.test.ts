import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { firms } from '../../../drizzle/schema'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { custodyLog } from '../../../server/utils/custody/custodyLog'
import { rebuildCaches } from '../../../server/utils/custody/rebuild'
import { statement } from '../../../server/utils/database/database'
import { lb } from '../../helpers/stamps'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'

let log: LogDatabase
beforeAll(async () => {
  log = await openLogDatabase()
  // A fault of the database that only some events meet, and that is none of its storage.
  await log.db.write([`CREATE TRIGGER refuses_poison BEFORE INSERT ON custody_events WHEN NEW.body LIKE '%poison%'
    BEGIN SELECT RAISE(ABORT, 'poisoned'); END`])
})
afterAll(() => log.close())

const outcomes = async (events: object[], access = log.technician) =>
  (await record(log.db, access, events)).map(({ outcome, problem }) => problem ? `${outcome} ${problem.status}` : outcome)
const kindsOf = async (id: string) => (await custodyLog(log.db, id, { limit: 50 })).items.map(({ kind }) => kind)
const findingsOf = async (id: string) => (await cylinderView(log.db, id, { access: null, nowMs: Date.now() }))!.findings.map(({ code }) => code)
const listed = async (id: string) => (await log.db.readClient.execute({ sql: 'SELECT finding_codes FROM cylinders WHERE id = ?', args: [id] })).rows[0]![0] as string

const minutesAgo = (minutes: number) => ({ occurredAt: new Date(Date.now() - minutes * 60_000).toISOString() })

/** Two cylinders, 5.5 lb of R-22 in the first, and a transfer of 3.5 lb between them. */
async function pair({ outLb = 3.5, inLb = 3.5 } = {}) {
  const [from, into] = [await newCylinder(log), await newCylinder(log)]
  await record(log.db, log.technician, [sent(from, 'filled', { refrigerant: 'R-22', grossBefore: lb(27.5), grossAfter: lb(33), looked: true }, minutesAgo(60))])
  const transferId = randomUUID()
  const both = { transferId, refrigerant: 'R-22', condition: 'clean' }
  return {
    from, into,
    out: sent(from, 'transferred', { ...both, direction: 'out', counterpartId: into, grossBefore: lb(33), grossAfter: lb(33 - outLb) }),
    in: sent(into, 'transferred', { ...both, direction: 'in', counterpartId: from, grossBefore: lb(27.5), grossAfter: lb(27.5 + inLb) }),
  }
}

describe('both halves of a transfer in one request', () => {
  it('are recorded together, and balance within the scales', async () => {
    const one = await pair({ inLb: 3.3 })
    expect(await outcomes([one.out, one.in])).toEqual(['accepted', 'accepted'])
    for (const id of [one.from, one.into]) {
      expect(await kindsOf(id)).toContain('transferred')
      expect(await findingsOf(id)).not.toContain('half-transfer')
      expect(await listed(id)).not.toContain('transfer')
    }
    const items = (await custodyLog(log.db, one.into, { limit: 1 })).items
    expect(items[0]!.otherCylinder).toMatchObject({ id: one.from })
  })

  it('that do not balance show on both cylinders, on their pages and in the fleet', async () => {
    const one = await pair({ inLb: 1.5 })
    expect(await outcomes([one.out, one.in])).toEqual(['accepted', 'accepted'])
    for (const id of [one.from, one.into]) {
      expect(await findingsOf(id)).toContain('transfer-unbalanced')
      expect(await listed(id)).toContain(' transfer-unbalanced ')
    }
  })

  it('are both kept out where one is malformed, even where its pair cannot be read; the others of the request go on', async () => {
    const one = await pair()
    const other = sent(one.from, 'weighed', { gross: lb(33) })
    expect(await outcomes([one.out, other, { ...one.in, details: { ...one.in.details as object, grossAfter: 7 } }])).toEqual(['refused 409', 'accepted', 'refused 400'])
    expect(await outcomes([{ ...one.in, details: { ...one.in.details as object, transferId: 'x' } }, one.out])).toEqual(['refused 400', 'refused 409'])
    expect(await kindsOf(one.from)).not.toContain('transferred')
    expect(await outcomes([one.out, one.in])).toEqual(['accepted', 'accepted'])
  })

  it('are both kept out where one names what nobody knows, or stands on another version', async () => {
    const one = await pair()
    const unknownOwner = { ...one.in, details: { ...one.in.details as object, ownerOfRefrigerantId: randomUUID() } }
    expect(await outcomes([one.out, unknownOwner])).toEqual(['refused 409', 'refused 422'])
    expect(await outcomes([one.out, { ...one.in, expects: 99 }])).toEqual(['refused 409', 'refused 409'])
    expect(await kindsOf(one.from)).not.toContain('transferred')
  })

  it('sent again are duplicates; one that is recorded already lets the other be judged alone', async () => {
    const one = await pair()
    expect(await outcomes([one.out])).toEqual(['accepted'])
    expect(await findingsOf(one.from)).toContain('half-transfer')
    expect(await outcomes([one.out, { ...one.in, details: { ...one.in.details as object, grossAfter: 7 } }])).toEqual(['duplicate', 'refused 400'])
    expect(await outcomes([one.out, one.in])).toEqual(['duplicate', 'accepted'])
    expect(await outcomes([one.in, one.out])).toEqual(['duplicate', 'duplicate'])
  })

  it('are not stored by half where one has the id of another event', async () => {
    const one = await pair()
    const taken = sent(one.into, 'weighed', { gross: lb(27.5) })
    expect(await outcomes([taken])).toEqual(['accepted'])
    expect(await outcomes([one.out, { ...one.in, id: taken.id }])).toEqual(['refused 409', 'refused 409'])
  })

  it('stay together where a batch is parted to find the event that the database refuses', async () => {
    const one = await pair()
    const two = await pair()
    const bad = sent(one.from, 'weighed', { gross: lb(33) }, { note: 'poison' })
    expect(await outcomes([one.out, bad, one.in])).toEqual(['accepted', 'refused 500', 'accepted'])
    expect(await outcomes([two.out, { ...two.in, note: 'poison' }, sent(two.from, 'weighed', { gross: lb(33) })])).toEqual(['refused 500', 'refused 500', 'accepted'])
    expect(await kindsOf(two.from)).not.toContain('transferred')
    // Both lines of the first are of one instant: they went in one commit.
    const { rows } = await log.db.readClient.execute({ sql: 'SELECT seq, recorded_at FROM custody_events WHERE id IN (?, ?) ORDER BY seq', args: [one.out.id, one.in.id] })
    expect(rows[1]![0]).toBe((rows[0]![0] as number) + 1)
  })

  it('are corrected both or neither, with other details or taken out, where one has changed since it was looked at', async () => {
    const one = await pair()
    await record(log.db, log.technician, [one.out, one.in, sent(one.into, 'weighed', { gross: lb(31) })])
    const mended = ({ cylinderId, id }: { cylinderId: string, id: string }, expects: number, instead?: object) =>
      sent(cylinderId, 'corrected', { eventId: id, reason: 'it was R-410A', ...instead && { instead } }, { expects })
    const other = (half: Record<string, unknown>) => ({ ...half.details as object, refrigerant: 'R-410A' })
    const by = log.manager
    expect(await outcomes([mended(one.out, 3, other(one.out)), mended(one.in, 2, other(one.in))], by)).toEqual(['refused 409', 'refused 409'])
    expect(await outcomes([mended(one.out, 3), sent(one.from, 'weighed', { gross: lb(29.5) }), mended(one.in, 2)], by)).toEqual(['refused 409', 'accepted', 'refused 409'])
    expect(await kindsOf(one.from)).not.toContain('corrected')
    expect(await outcomes([mended(one.out, 4, other(one.out)), mended(one.in, 3, other(one.in))], by)).toEqual(['accepted', 'accepted'])
    // One half alone may be corrected, and two corrections of one half stand each for itself.
    expect(await outcomes([mended(one.out, 5, other(one.out)), mended(one.out, 5, other(one.out))], by)).toEqual(['accepted', 'refused 409'])
  })

  it('are for who works with cylinders, and never from one into itself', async () => {
    const one = await pair()
    const auditor = { personId: randomUUID(), roles: ['auditor' as const], trainee: false }
    expect(await outcomes([one.out, one.in], auditor)).toEqual(['refused 403', 'refused 403'])
    expect(await outcomes([{ ...one.out, details: { ...one.out.details as object, counterpartId: one.from } }])).toEqual(['refused 400'])
    expect(await outcomes([one.out, one.in], log.warehouse)).toEqual(['accepted', 'accepted'])
  })
})

describe('one half alone', () => {
  it('shows on its cylinder until the other arrives, and on the other when it is taken out again', async () => {
    const one = await pair()
    await record(log.db, log.technician, [one.out])
    expect(await listed(one.from)).toContain(' half-transfer ')
    expect(await listed(one.into)).not.toContain('half-transfer')
    await record(log.db, log.technician, [one.in])
    for (const id of [one.from, one.into]) expect(await listed(id)).not.toContain('half-transfer')
    const takenOut = sent(one.into, 'corrected', { eventId: one.in.id, reason: 'another cylinder' })
    expect(await outcomes([takenOut])).toEqual(['accepted'])
    expect(await listed(one.from)).toContain(' half-transfer ')
    expect(await findingsOf(one.from)).toContain('half-transfer')
    expect(await listed(one.into)).not.toContain('half-transfer')
  })

  it('follows a late weight that changes what went over', async () => {
    const one = await pair()
    const { grossBefore: _, ...late } = one.out.details as Record<string, unknown>
    await record(log.db, log.technician, [{ ...one.out, details: late, ...minutesAgo(10) }, { ...one.in, ...minutesAgo(10) }])
    expect(await listed(one.into)).not.toContain('transfer-unbalanced')
    // Weighed before the transfer and told after it: 3.5 lb came in, and by this reading 7.5 lb went out.
    await record(log.db, log.technician, [sent(one.from, 'weighed', { gross: lb(37) }, minutesAgo(11))])
    for (const id of [one.from, one.into]) expect(await listed(id)).toContain(' transfer-unbalanced ')
  })
})

describe('an exchange', () => {
  it('is recorded whole, and made again to the last byte', async () => {
    const [out, into] = [await newCylinder(log), await newCylinder(log)]
    const firmId = randomUUID()
    await log.db.write([statement(log.db.read.insert(firms).values({ id: firmId, name: 'A supplier', kind: 'supplier', createdAt: 0 }))])
    const exchange = { exchangeId: randomUUID(), firmId }
    expect(await outcomes([
      sent(out, 'exchanged', { ...exchange, direction: 'out', otherCylinderId: into }),
      sent(into, 'exchanged', { ...exchange, direction: 'in', otherCylinderId: out }, { placeId: log.placeId }),
    ], log.warehouse)).toEqual(['accepted', 'accepted'])
    const views = await Promise.all([out, into].map(id => cylinderView(log.db, id, { access: null, nowMs: Date.now() })))
    expect(views.map(view => view!.owner?.id ?? null)).toEqual([firmId, null])
    expect(views[1]!.place!.id).toBe(log.placeId)
    const tables = async () => JSON.stringify(await log.db.readClient.batch(['SELECT * FROM halves ORDER BY event_id', 'SELECT * FROM cylinders ORDER BY id'], 'read').then(all => all.map(({ rows }) => rows)))
    const live = await tables()
    await rebuildCaches(log.db, Date.now())
    expect(await tables()).toBe(live)
  })
})
