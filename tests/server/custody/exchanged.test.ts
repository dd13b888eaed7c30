import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { firms, places } from '../../../drizzle/schema'
import { dateBounds } from '../../../server/utils/custody/dateBounds'
import { fleet } from '../../../server/utils/custody/fleet'
import { fleetSummary } from '../../../server/utils/custody/fleetSummary'
import { statement } from '../../../server/utils/database/database'
import { directory } from '../../../server/utils/directory/directory'
import { cylinderFacts, unlabelledFacts } from '../../../server/utils/now/cylinderFacts'
import { fleetQuery } from '../../../utils/contract/custody'
import { openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { lb, stampOf } from '../../helpers/stamps'

let log: LogDatabase
let came: string
const gone = randomUUID()
const supplier = randomUUID()
const supplierPlace = randomUUID()
const now = Date.now()

const ids = async (query: Record<string, unknown> = {}) => (await fleet(log.db, fleetQuery.parse(query), now)).items.map(({ id }) => id)
const registered = (id: string, serial: string, more: object = {}) => sent(id, 'registered', {
  stamp: stampOf({ serial, madeMonth: '2018-01' }), marks: [], ownership: 'own', contents: 'evacuated', gross: lb(27.5), ...more,
}, { placeId: log.placeId })

beforeAll(async () => {
  log = await openLogDatabase()
  await log.db.write([
    statement(log.db.read.insert(firms).values({ id: supplier, name: 'Gases', kind: 'supplier', createdAt: 0 })),
    statement(log.db.read.insert(places).values({ id: supplierPlace, name: 'Gases', kind: 'firm', firmId: supplier, createdAt: 0 })),
  ])
  await directory(log.db, true)
  came = randomUUID()
  const exchange = { exchangeId: randomUUID(), firmId: supplier }
  const results = [
    ...await record(log.db, log.warehouse, [registered(gone, 'GONE1', { contents: { refrigerant: 'R-22', condition: 'clean' }, gross: lb(57.5) }), registered(came, 'CAME1')]),
    ...await record(log.db, log.warehouse, [
      sent(gone, 'exchanged', { ...exchange, otherCylinderId: came, direction: 'out' }, { placeId: log.placeId }),
      sent(came, 'exchanged', { ...exchange, otherCylinderId: gone, direction: 'in' }, { placeId: log.placeId }),
    ]),
  ]
  expect(results.map(({ outcome }) => outcome)).toEqual(['accepted', 'accepted', 'accepted', 'accepted'])
})
afterAll(() => log.close())

describe('a cylinder given away in an exchange', () => {
  it('leaves the fleet as many as before: the one that came counts in its place', async () => {
    const summary = await fleetSummary(log.db, now)
    // Both were made in 2018 and never retested: only the one that is here is late, and nothing is in it.
    expect(summary).toMatchObject({ total: 1, late: 1, stop: 1, notSeen: { count: 0 }, full: { count: 0 }, refrigerants: [] })
    expect(summary.dueByMonth.every(({ count }) => count === 0)).toBe(true)
    const list = await fleet(log.db, fleetQuery.parse({}), now)
    expect(list.items.map(({ id }) => id)).toEqual([came])
    expect(list.total).toBe(1)
  })

  it('is in no list of what is to be done', async () => {
    expect(await ids({ finding: 'retest-overdue' })).toEqual([came])
    expect(await ids({ dueBefore: '2099-01' })).toEqual([came])
    expect(await ids({ lifecycle: 'in-service' })).toEqual([came])
    expect(await ids({ refrigerant: 'R-22' })).toEqual([])
    const bounds = dateBounds(await directory(log.db), now)
    const facts = await cylinderFacts(log.db, [['late', { finding: 'retest-overdue', lifecycle: 'in-service' }]], bounds, now)
    expect(facts.late).toMatchObject({ count: 1, netGrams: 0, withContents: 0 })
    expect((await unlabelledFacts(log.db, now))?.count).toBe(1)
  })

  it('is found by its serial, by the firm that has it, and where those given away are asked for', async () => {
    expect(await ids({ q: 'GONE' })).toEqual([gone])
    expect(await ids({ owner: supplier })).toEqual([gone])
    expect(await ids({ place: supplierPlace })).toEqual([gone])
    expect(await ids({ lifecycle: 'given-away' })).toEqual([gone])
  })

  it('is in the fleet again once it has come back', async () => {
    await record(log.db, log.warehouse, [sent(gone, 'received', { fromFirmId: supplier }, { placeId: log.placeId })])
    expect((await ids()).sort()).toEqual([came, gone].sort())
    expect(await ids({ lifecycle: 'given-away' })).toEqual([])
    expect((await fleetSummary(log.db, now)).total).toBe(2)
  })
})
