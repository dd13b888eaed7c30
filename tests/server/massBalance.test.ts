import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { recordedEvents } from '../../server/utils/custody/custodyLog'
import { foldContext } from '../../server/utils/custody/foldContext'
import { rebuildCaches } from '../../server/utils/custody/rebuild'
import { directory } from '../../server/utils/directory/directory'
import type { Database } from '../../server/utils/database/database'
import { booksOf } from '../../server/utils/records/bookSums'
import { massBalance } from '../../server/utils/records/massBalance'
import type { BalanceMovementsAnswer, MassBalanceAnswer } from '../../utils/contract/massBalance'
import { fold } from '../../utils/custody/fold'
import { bookSums, stockSums, type Span } from '../../utils/records/books'
import { eventOf, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../helpers/logDatabase'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

describe('the books in the database', () => {
  let log: LogDatabase
  const ids: string[] = []
  const DAY = 86_400_000
  const now = Date.parse('2026-06-15T17:00:00Z')
  const at = (days: number) => ({ occurredAt: new Date(now - days * DAY).toISOString() })

  beforeAll(async () => {
    log = await openLogDatabase()
    for (let index = 0; index < 4; index++) {
      const id = await newCylinder(log)
      ids.push(id)
      const told = [
        sent(id, 'filled', { refrigerant: index % 2 ? 'R-22' : 'R-410A', grossAfter: lb(40 + index), looked: true }, at(50)),
        sent(id, 'drawn', { grossAfter: lb(38), purpose: 'same-owner' }, { ...at(20), practice: index === 3 }),
        sent(id, 'weighed', { gross: lb(37.5) }, at(10)),
        sent(id, 'filled', { refrigerant: 'R-22', grossAfter: lb(39), looked: true }, at(2)),
        // Comes last and takes its place before all but the registration.
        sent(id, 'weighed', { gross: lb(27.6) }, at(60)),
      ]
      for (const event of told) {
        const results = await record(log.db, log.technician, [event], { now })
        expect(results[0]?.outcome).toBe('accepted')
      }
    }
  })
  afterAll(() => log.close())

  const spans: [string, Span][] = [
    ['a month', { fromMs: now - 30 * DAY, untilMs: now }],
    ['the instant of an event on', { fromMs: now - 20 * DAY, untilMs: now - 10 * DAY }],
    ['always', { fromMs: 0, untilMs: now + 1000 * DAY }],
    ['no time at all', { fromMs: now, untilMs: now }],
  ]
  const sorted = (all: object[]) => all.map(one => JSON.stringify(one, Object.keys(one).sort())).sort()

  it.each(spans)('sum for %s as the log does, one movement at a time', async (_, span) => {
    const context = foldContext(await directory(log.db))
    const folds = await Promise.all(ids.map(async id => fold(await recordedEvents(log.db, id), context)))
    const counted = (sums: { movements: number }[]) => sums.filter(({ movements }) => movements > 0)
    const { books, stock } = await booksOf(log.db, span, {})
    expect(sorted(counted(books))).toEqual(sorted(counted(bookSums(folds.flatMap(one => one.movements), span))))
    expect(sorted(stock)).toEqual(sorted(stockSums(folds.flatMap(one => one.stockChanges), span)))
  })

  it('take one refrigerant, one owner, or both', async () => {
    const { books: all } = await booksOf(log.db, spans[2]![1], {})
    const { books: named } = await booksOf(log.db, spans[2]![1], { refrigerant: 'R-22' })
    const { books: unnamed } = await booksOf(log.db, spans[2]![1], { refrigerant: null, ownerId: null })
    expect(sorted(named)).toEqual(sorted(all.filter(({ refrigerant }) => refrigerant === 'R-22')))
    expect(unnamed.length).toBeGreaterThan(0)
    expect(sorted(unnamed)).toEqual(sorted(all.filter(({ refrigerant, ownerId }) => refrigerant === null && ownerId === null)))
    expect((await booksOf(log.db, spans[2]![1], { ownerId: randomUUID() })).books).toEqual([])
  })

  it('agree with the cylinders though something is recorded between two questions', async () => {
    let asked = 0
    const batch: Database['readClient']['batch'] = async (...question) => {
      if (asked++ > 0) await record(log.db, log.technician, [sent(ids[0]!, 'weighed', { gross: lb(38) }, at(1))], { now })
      return log.db.readClient.batch(...question)
    }
    const readClient = new Proxy(log.db.readClient, { get: (client, name) => name === 'batch' ? batch : Reflect.get(client, name, client) as unknown })
    const { balances } = await massBalance({ ...log.db, readClient }, { from: '2026-01-01', to: '2026-12-31' }, now)
    expect(asked).toBeGreaterThan(0)
    expect(balances.length).toBeGreaterThan(0)
    for (const { account } of balances) expect(account.agrees).toBe(true)
  })

  it('are the same after a rebuild', async () => {
    const books = () => log.db.readClient.batch(['movements', 'stock_changes'].map(table => `SELECT * FROM ${table} ORDER BY cylinder_id, event_id, ordinal`), 'read')
    const live = JSON.stringify((await books()).map(({ rows }) => rows))
    await rebuildCaches(log.db, now)
    expect(JSON.stringify((await books()).map(({ rows }) => rows))).toBe(live)
  })
})

describe('GET /api/reports/mass-balance', () => {
  let server: TestServer
  let shop: Shop
  let customerId: string

  beforeAll(async () => {
    server = await startServer()
    shop = await openShop(server)
    const customer = await shop.admin.client.post<{ id: string }>('/api/firms', { name: '=Heron Foods', kind: 'customer' })
    customerId = customer.body.id
    const [view] = [await registered(shop, { contents: 'evacuated' })]
    // TW 27.5 lb: 6 lb ours, then 3 lb the customer's, then 1 lb less than the log says.
    const happened = [
      { ...eventOf(view.id, 'filled'), details: { refrigerant: 'R-22', grossAfter: lb(33.5), looked: true } },
      { ...eventOf(view.id, 'filled'), details: { refrigerant: 'R-22', grossAfter: lb(36.5), looked: true, ownerOfRefrigerantId: customerId } },
      { ...eventOf(view.id, 'weighed'), details: { gross: lb(35.5) } },
    ]
    // All within a moment, one after the other.
    const begunAt = Date.parse(happened[2]!.occurredAt)
    await posted(shop.technician.client, happened.map((event, index) => ({ ...event, occurredAt: new Date(begunAt - 2 + index).toISOString() })))
    await registered(shop, { contents: { refrigerant: 'R-410A', condition: 'clean' }, gross: lb(30) })
  }, 120_000)
  afterAll(() => server.stop())

  const balance = (query = '') => shop.auditor.client.get<MassBalanceAnswer>(`/api/reports/mass-balance${query}`)

  it('is read by the warehouse, the manager and the auditor, and by nobody else', async () => {
    const asked = [shop.warehouse, shop.manager, shop.auditor, shop.technician, shop.admin].flatMap(({ client }) =>
      ['/api/reports/mass-balance', '/api/reports/mass-balance/movements?line=recovered'].map(async path => (await client.get(path)).status))
    expect(await Promise.all(asked)).toEqual([200, 200, 200, 200, 200, 200, 403, 403, 403, 403])
  })

  it('answers this month, every refrigerant with its owners, to the gram', async () => {
    const { body } = await balance()
    expect(body.balances.map(({ refrigerant }) => refrigerant)).toEqual(['R-22', 'R-410A'])
    const { account, owners } = body.balances[0]!
    // 36.5 lb is 16,556 g, 33.5 lb 15,195 g, 35.5 lb 16,103 g; TW 27.5 lb is 12,474 g: 2,721 g ours, 1,361 g theirs, 453 g less.
    expect(account).toMatchObject({ openingGrams: 0, closingGrams: 3629, agrees: true, unexplained: { grams: -453, isMore: true } })
    expect(account.causes.find(({ cause }) => cause === 'recovered')).toEqual({ cause: 'recovered', grams: 4082, movements: 2 })
    // Of the 453 g two thirds are ours, one third the customer's.
    expect(owners.map(({ owner, account: own }) => [owner?.name ?? 'own', own.closingGrams])).toEqual([['own', 2419], ['=Heron Foods', 1210]])
  })

  it('answers for one refrigerant and one owner', async () => {
    const { body } = await balance(`?refrigerant=r-22&owner=${customerId}`)
    expect(body.balances.map(({ refrigerant, account }) => [refrigerant, account.closingGrams])).toEqual([['R-22', 1210]])
    expect((await balance('?refrigerant=R-22&owner=own')).body.balances[0]?.account.closingGrams).toBe(2419)
    expect((await balance('?refrigerant=unknown')).body.balances).toEqual([])
  })

  it('answers for the days asked for, in the firm\'s time zone', async () => {
    const { body } = await balance('?from=2026-03-01&to=2026-03-31')
    expect(body.period).toEqual({ from: '2026-03-01', to: '2026-03-31', fromAt: '2026-03-01T06:00:00.000Z', untilAt: '2026-04-01T05:00:00.000Z' })
  })

  it('refuses days that are none, and a last day before the first', async () => {
    expect((await balance('?from=2026-02-30')).status).toBe(400)
    expect((await balance('?from=1x')).status).toBe(400)
    expect((await balance('?owner=everybody')).status).toBe(400)
    expect((await balance('?from=2026-03-31&to=2026-03-01')).status).toBe(422)
  })

  it('gives a table of values in grams, each owner a line, in which a name is never reckoned', async () => {
    const { body, headers } = await shop.auditor.client.get<string>('/api/reports/mass-balance', { accept: 'text/csv' })
    expect(headers.get('content-type')).toBe('text/csv; charset=utf-8; header=present')
    const lines = body.trimEnd().split('\r\n')
    expect(lines[0]).toMatch(/^From,To,Refrigerant,Owner,"Opening stock, g","First known, g","Recovered, g",/)
    expect(lines.slice(1).map(text => text.split(',').slice(2, 7))).toEqual([
      ['R-22', 'Our own', '0', '0', '2721'], ['R-22', '\'=Heron Foods', '0', '0', '1361'], ['R-410A', 'Our own', '0', '1134', '0'],
    ])
  })

  it('lists the movements behind a line, newest first, in pages', async () => {
    const path = '/api/reports/mass-balance/movements?line=recovered&refrigerant=R-22&limit=1'
    const first = await shop.manager.client.get<BalanceMovementsAnswer>(path)
    expect(first.body.items).toMatchObject([{ kind: 'filled', grams: 1361, owner: { name: '=Heron Foods' }, cause: 'recovered' }])
    const second = await shop.manager.client.get<BalanceMovementsAnswer>(`${path}&cursor=${first.body.nextCursor}`)
    expect(second.body).toMatchObject({ items: [{ grams: 2721, owner: null }], nextCursor: null })
    expect((await shop.manager.client.get(`${path}&cursor=mine`)).status).toBe(400)
    expect((await shop.manager.client.get('/api/reports/mass-balance/movements')).status).toBe(400)
  })
})
