import { randomUUID } from 'node:crypto'
import { createClient } from '@libsql/client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { EventResult, EventsAnswer } from '../../utils/contract/custody'
import type { LogVerification } from '../../utils/contract/log'
import type { TestClient } from '../helpers/client'
import { cylinderNow, eventOf, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { IN_FULL } from '../helpers/inFull'
import { newCylinder, openLogDatabase, record, sent } from '../helpers/logDatabase'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'
import { brokenPromises, storedLines, type StoredLine } from '../helpers/storedLines'

const POSTS = 200
/** Further posts, to as many cylinders as a tenth of them. */
const SPREAD_POSTS = IN_FULL ? 2_000 : 400
const RACES = IN_FULL ? 200 : 20
const MOST_ATTEMPTS = 5

let server: TestServer
let shop: Shop
beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
})
afterAll(() => server?.stop())

/** Posts, and sends again where a connection closed under it: what was stored by then is a duplicate the second time. */
async function post(client: TestClient, events: object[]): Promise<EventResult[]> {
  for (let attempt = 1; ; attempt++) {
    const answer = await client.post<EventsAnswer>('/api/events', { events }).catch((error: unknown) => {
      if (attempt === MOST_ATTEMPTS) throw error
      return null
    })
    if (answer === null) continue
    if (answer.status !== 200) throw new Error(`The events answered ${answer.status}: ${JSON.stringify(answer.body)}`)
    return answer.body.results.map(result => attempt > 1 && result.outcome === 'duplicate' ? { ...result, outcome: 'accepted' } : result)
  }
}

type SentEvent = ReturnType<typeof eventOf> & { details: object }

const weighing = (cylinderId: string, grossLb = 40): SentEvent => ({ ...eventOf(cylinderId, 'weighed'), details: { gross: lb(grossLb) } })

async function linesInFile(): Promise<StoredLine[]> {
  const readClient = createClient({ url: `file:${server.databaseFile}`, timeout: 5_000 })
  try {
    return await storedLines({ readClient })
  }
  finally {
    readClient.close()
  }
}

/** Holds that each answer named the very line that is stored, and that no number is missing. */
async function expectStoredAsAnswered(results: readonly EventResult[]): Promise<void> {
  const lines = await linesInFile()
  expect(brokenPromises(results.map(({ id }) => id), lines)).toEqual([])
  const byId = new Map(lines.map(line => [line.id, line]))
  expect(results.filter(({ id, seq, version }) => byId.get(id)?.seq !== seq || byId.get(id)?.version !== version)).toEqual([])
}

describe('posts at the same moment', () => {
  it(`to one cylinder, ${POSTS} of them, take its versions without a gap, and each is read back once it is answered`, async () => {
    const { id, version } = await registered(shop)
    const tooOld: number[] = []
    const results = (await Promise.all(Array.from({ length: POSTS }, async (_, index) => {
      const answer = await post(shop.technician.client, [weighing(id, 30 + index / 20)])
      const now = (await cylinderNow(shop.technician.client, id)).version
      if (now < answer[0]!.version!) tooOld.push(now)
      return answer
    }))).flat()
    expect(results.map(({ outcome }) => outcome)).toEqual(Array(POSTS).fill('accepted'))
    expect(results.map(one => one.version!).sort((a, b) => a - b)).toEqual(Array.from({ length: POSTS }, (_, index) => version + 1 + index))
    expect(tooOld).toEqual([])
    await expectStoredAsAnswered(results)
  })

  it(`to ${SPREAD_POSTS / 10} cylinders, ${SPREAD_POSTS} of them, are each stored as answered`, async () => {
    const ids: string[] = []
    while (ids.length < SPREAD_POSTS / 10) ids.push((await registered(shop, { isLabelled: false })).id)
    const results = (await Promise.all(Array.from({ length: SPREAD_POSTS }, (_, index) => post(shop.technician.client, [weighing(ids[index % ids.length]!)])))).flat()
    expect(results.map(({ outcome }) => outcome)).toEqual(Array(SPREAD_POSTS).fill('accepted'))
    await expectStoredAsAnswered(results)
    const { body } = await shop.manager.client.get<LogVerification>('/api/log/verify')
    expect(body.ok).toBe(true)
  })
})

describe('of two who decide on the same version', () => {
  const both = (results: EventResult[]) => results.map(({ outcome, problem }) => problem ? `${outcome} ${problem.status}` : outcome).sort()

  it(`at one server, one wins and the other is told, ${RACES} times`, async () => {
    const { id } = await registered(shop)
    for (let race = 0; race < RACES; race++) {
      const [before] = await posted(shop.manager.client, [{ ...eventOf(id, 'quarantined'), details: { reason: 'an oily valve' } }])
      const release = () => post(shop.manager.client, [{ ...eventOf(id, 'released'), expects: before!.version, details: { reason: 'wiped and dry' } }])
      expect(both((await Promise.all([release(), release()])).flat())).toEqual(['accepted', 'refused 409'])
      expect((await cylinderNow(shop.manager.client, id)).version).toBe(before!.version + 1)
    }
  })

  it(`in two processes on one file, one wins and the other is told, ${RACES} times`, async () => {
    const log = await openLogDatabase()
    try {
      const [id, other] = [await newCylinder(log), await log.openAgain()]
      for (let race = 0; race < RACES; race++) {
        const [held] = await record(log.db, log.manager, [sent(id, 'quarantined', { reason: 'an oily valve' })])
        const release = (db: typeof other) => record(db, log.manager, [sent(id, 'released', { reason: 'wiped and dry' }, { expects: held!.version! })])
        expect(both((await Promise.all([release(log.db), release(other)])).flat())).toEqual(['accepted', 'refused 409'])
      }
      expect(brokenPromises([], await storedLines(log.db))).toEqual([])
      expect(await storedLines(log.db)).toHaveLength(1 + 2 * RACES)
    }
    finally {
      log.close()
    }
  })
})

describe('of twenty events in one request', () => {
  const PAIR = [7, 12]

  /** Eighteen weighings, with both halves of a transfer among them. */
  function twenty(from: string, into: string): SentEvent[] {
    const pair = { transferId: randomUUID(), refrigerant: 'R-22', condition: 'clean' }
    const events: SentEvent[] = Array.from({ length: 20 }, (_, index) => weighing(index % 2 ? from : into))
    events[PAIR[0]!] = { ...eventOf(from, 'transferred'), details: { ...pair, direction: 'out', counterpartId: into, grossAfter: lb(38) } }
    events[PAIR[1]!] = { ...eventOf(into, 'transferred'), details: { ...pair, direction: 'in', counterpartId: from, grossAfter: lb(42) } }
    return events
  }

  it.each([
    ['that cannot be read', { details: { gross: { unit: 'lb', value: -3 } } }, 400],
    ['that the database itself turns down', { note: 'poison' }, 500],
  ])('the one %s is refused alone, wherever it stands, or with the other half of its pair', async (_, poison, status) => {
    const database = createClient({ url: `file:${server.databaseFile}`, timeout: 5_000 })
    await database.execute(`CREATE TRIGGER IF NOT EXISTS refuses_poison BEFORE INSERT ON custody_events WHEN NEW.body LIKE '%poison%'
      BEGIN SELECT RAISE(ABORT, 'poisoned'); END`)
    database.close()
    const [from, into] = [(await registered(shop)).id, (await registered(shop)).id]
    for (let bad = 0; bad < 20; bad++) {
      const events = twenty(from, into)
      events[bad] = { ...events[bad]!, ...poison }
      const results = await post(shop.technician.client, events)
      const refused = PAIR.includes(bad) ? PAIR : [bad]
      expect(results.flatMap(({ outcome }, index) => outcome === 'accepted' ? [] : [index]), `bad at ${bad}`).toEqual(refused)
      expect(results[bad]!.problem!.status).toBe(status)
      const stored = new Set((await linesInFile()).map(({ id }) => id))
      expect(events.flatMap(({ id }, index) => stored.has(id) ? [] : [index]), `bad at ${bad}`).toEqual(refused)
    }
  })
})
