import { randomBytes, randomUUID } from 'node:crypto'
import { setTimeout as wait } from 'node:timers/promises'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { rebuildCaches } from '../../server/utils/custody/rebuild'
import { openDatabase } from '../../server/utils/database/database'
import type { LogVerification } from '../../utils/contract/log'
import { drawLabelCode } from '../../utils/label/code'
import { cacheLines } from '../helpers/caches'
import { eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { IN_FULL, seeds } from '../helpers/inFull'
import { phone, type Sent } from '../helpers/phone'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'
import { brokenPromises, storedLines } from '../helpers/storedLines'
import { seededChance, type Chance } from '../helpers/tampering'

const PHONES = 12
const KILLS = IN_FULL ? 200 : 20
const CYLINDERS = IN_FULL ? 60 : 6
/** Events that are acknowledged from one kill to the next. */
const MOST_BETWEEN_KILLS = 40
/** A kill finds an answer on its way now and then; where so few do, nothing of sending again was tried. */
const REPEATED_AT_LEAST = KILLS / 10

let server: TestServer
let shop: Shop
beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
})
afterAll(() => server?.stop())

/** Few, so that one code comes to stand on several cylinders. */
const CODES = Array.from({ length: 4 }, () => drawLabelCode(randomBytes))

/** What a phone records next: a weighing, one told late, a fill, a label, or both halves of a transfer. */
function nextOf(cylinders: readonly string[], chance: Chance): () => Sent[] {
  const happened = (kind: string, id: string, details: object, agoMs = 0): Sent =>
    ({ ...eventOf(id, kind), occurredAt: new Date(Date.now() - agoMs).toISOString(), details })
  return () => {
    const one = chance(cylinders.length)
    const [id, other] = [cylinders[one]!, cylinders[(one + 1) % cylinders.length]!]
    const gross = lb(36 + chance(40) / 10)
    switch (chance(8)) {
      case 0: return [happened('weighed', id, { gross }, chance(60_000))]
      case 1: return [happened('filled', id, { refrigerant: 'R-22', grossAfter: gross, looked: true }), happened('weighed', id, { gross })]
      case 2: {
        const pair = { transferId: randomUUID(), refrigerant: 'R-22', condition: 'clean' }
        return [
          happened('transferred', id, { ...pair, direction: 'out', counterpartId: other, grossAfter: lb(36) }),
          happened('transferred', other, { ...pair, direction: 'in', counterpartId: id, grossAfter: gross }),
        ]
      }
      case 3: return [happened('labelled', id, { code: CODES[chance(CODES.length)] })]
      default: return [happened('weighed', id, { gross })]
    }
  }
}

const [seed = 1] = seeds(1)

it(`keeps every event that it answered, each once, through ${KILLS} kills in the middle of posts by ${PHONES} phones (seed ${seed})`, { timeout: 3_600_000 }, async () => {
  const chance = seededChance(seed)
  const cylinders = await Promise.all(Array.from({ length: CYLINDERS }, async () => (await registered(shop)).id))
  const before = 2 * CYLINDERS
  const phones = Array.from({ length: PHONES }, (_, index) => phone(shop.technician.client, nextOf(cylinders, seededChance(seed * PHONES + index))))
  const failed = Promise.race(phones.map(one => one.ended))
  const acknowledgedMore = async (count: number) => {
    const acknowledged = () => phones.reduce((sum, one) => sum + one.acknowledged.length, 0)
    for (const until = acknowledged() + count; acknowledged() < until;) await wait(1)
  }
  // By what was recorded, not by the clock: so that a slow machine is killed in the middle of posts as well.
  for (let kill = 0; kill < KILLS; kill++) {
    await Promise.race([acknowledgedMore(1 + chance(MOST_BETWEEN_KILLS)), failed])
    await wait(chance(20))
    await server.restart()
  }
  await Promise.race([acknowledgedMore(MOST_BETWEEN_KILLS), failed])
  await Promise.all(phones.map(one => one.switchOff()))
  const acknowledged = phones.flatMap(one => one.acknowledged)
  const repeated = phones.reduce((sum, one) => sum + one.repeated(), 0)

  const { body: verified } = await shop.manager.client.get<LogVerification>('/api/log/verify')
  await server.kill()
  const db = await openDatabase(`file:${server.databaseFile}`)
  try {
    const lines = await storedLines(db)
    expect(brokenPromises(acknowledged, lines)).toEqual([])
    // Every phone was heard out, so nothing is stored that was not acknowledged.
    expect(lines).toHaveLength(before + acknowledged.length)
    expect(verified).toMatchObject({ ok: true, checked: lines.length, cylinders: CYLINDERS })
    expect((await db.readClient.execute('PRAGMA integrity_check')).rows.map(row => row[0])).toEqual(['ok'])
    const live = await cacheLines(db)
    await rebuildCaches(db, Date.now())
    expect(await cacheLines(db)).toEqual(live)
  }
  finally {
    db.close()
  }
  console.log(`${KILLS} kills: ${acknowledged.length} events acknowledged, all stored once; ${repeated} answered as duplicates`)
  expect(acknowledged.length).toBeGreaterThan(10 * KILLS)
  expect(repeated).toBeGreaterThanOrEqual(REPEATED_AT_LEAST)
})

describe('what holds the log against what was acknowledged', () => {
  const line = (seq: number, version: number) => ({ id: `event ${seq}`, cylinderId: 'c', seq, version })
  const whole = [line(1, 1), line(2, 2), line(3, 3)]

  it('has nothing to say of a log that is whole', () => {
    expect(brokenPromises(['event 1', 'event 3'], whole)).toEqual([])
  })

  it('tells of an event that is lost, one that is there twice, and numbers that are missing', () => {
    expect(brokenPromises(['event 1', 'event 4'], whole)).toEqual(['event 4 was acknowledged and is lost'])
    expect(brokenPromises([], [...whole, { ...line(4, 4), id: 'event 2' }])).toEqual(['event 2 is stored 2 times'])
    expect(brokenPromises([], [line(1, 1), line(3, 3)])).toEqual(['line 3 stands where 2 should', 'version 3 of c follows 1'])
  })
})
