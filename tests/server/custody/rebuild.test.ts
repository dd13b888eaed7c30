import { randomBytes, randomUUID } from 'node:crypto'
import { resolve } from 'node:path'
import { setImmediate as nextTurn } from 'node:timers/promises'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { bringCachesToShape, cacheShape, storedShape } from '../../../server/utils/custody/cacheShape'
import { cylinderView } from '../../../server/utils/custody/cylinderViews'
import { fleet } from '../../../server/utils/custody/fleet'
import { rebuildCaches } from '../../../server/utils/custody/rebuild'
import { runRebuild } from '../../../server/utils/custody/runRebuild'
import type { Database } from '../../../server/utils/database/database'
import { holdDatabaseFile } from '../../../server/utils/database/singleServer'
import { fleetQuery } from '../../../utils/contract/custody'
import { drawLabelCode } from '../../../utils/label/code'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { lb } from '../../helpers/stamps'

const CACHES = ['cylinders', 'movements', 'stock_changes', 'label_claims', 'halves']

let log: LogDatabase
beforeEach(async () => {
  log = await openLogDatabase()
  vi.spyOn(console, 'log').mockImplementation(() => undefined)
})
afterEach(() => {
  vi.restoreAllMocks()
  log.close()
})

/** All caches to the last byte, in an order that no rebuild changes. */
async function caches(db: Database = log.db): Promise<string[]> {
  const tables = await Promise.all(CACHES.map(table => db.readClient.execute(`SELECT * FROM ${table}`)))
  return tables.flatMap(({ rows }, at) => rows.map(row => `${CACHES[at]} ${JSON.stringify(row)}`)).sort()
}

const filledTo = (id: string, grossLb: number, more: object = {}) => sent(id, 'filled', { refrigerant: 'R-22', grossAfter: lb(grossLb), looked: true }, more)

/** Cylinders filled, one code on two of them, and a transfer between two. */
async function someFleet(count = 4): Promise<string[]> {
  const ids: string[] = []
  for (let n = 0; n < count; n += 50) ids.push(...await Promise.all(Array.from({ length: Math.min(50, count - n) }, () => newCylinder(log))))
  const code = drawLabelCode(randomBytes)
  const pair = { transferId: randomUUID(), refrigerant: 'R-22', condition: 'clean' }
  const results = await record(log.db, log.technician, [
    filledTo(ids[0]!, 60), filledTo(ids[1]!, 40, { occurredAt: new Date(Date.now() - 3_600_000).toISOString() }),
    sent(ids[0]!, 'labelled', { code }), sent(ids[1]!, 'labelled', { code }),
    sent(ids[1]!, 'transferred', { ...pair, direction: 'out', counterpartId: ids[2], grossBefore: lb(40), grossAfter: lb(36) }),
    sent(ids[2]!, 'transferred', { ...pair, direction: 'in', counterpartId: ids[1], grossBefore: lb(27.5), grossAfter: lb(31.5) }),
  ])
  expect(results.map(({ outcome }) => outcome)).toEqual(Array.from({ length: 6 }, () => 'accepted'))
  return ids
}

describe('making the caches again', () => {
  it('comes to the very bytes of the live ones, and takes out what the log does not know', async () => {
    const [first] = await someFleet()
    const live = await caches()
    await log.db.write([
      `UPDATE cylinders SET net_grams = 1, state = '{}' WHERE id = '${first}'`,
      `INSERT INTO cylinders SELECT '${randomUUID()}', ${'version, label_code, serial, spec, place_id, holder_id, owner_id, refrigerant, condition, lifecycle, given_away, nothing_in_it, net_grams, fill_limit_grams, governing_rule, room_grams, stop_weight_grams, exact_stop_weight, tare_weight_grams, water_capacity_grams, due_month, retest_state, last_event_at, last_event_kind, last_seen_at, finding_codes, severity, state, ruled_by'} FROM cylinders LIMIT 1`,
      `INSERT INTO movements VALUES ('${randomUUID()}', '${randomUUID()}', 0, 'weighing', 'R-22', NULL, 5, 1, 0)`,
      `UPDATE movements SET grams = grams + 1`, 'DELETE FROM stock_changes',
      `UPDATE label_claims SET cylinder_id = '${first}'`, 'DELETE FROM halves',
    ])
    expect(await rebuildCaches(log.db, Date.now())).toEqual({ cylinders: 4, events: 10 })
    expect(await caches()).toEqual(live)
  })

  it('never shows a reader an empty fleet, fewer cylinders or another net, while events are recorded', async () => {
    const ids = await someFleet(210)
    const query = fleetQuery.parse({ limit: 200 })
    let isOver = false
    let reads = 0
    const watch = async () => {
      while (!isOver) {
        const now = await fleet(log.db, query, Date.now())
        // Both labels are read again and again: a stop that is due may not blink.
        const shared = now.items.filter(({ findingCodes }) => findingCodes.includes('code-on-two'))
        expect([now.total, now.items.length, shared.length]).toEqual([210, 200, 2])
        expect((await cylinderView(log.db, ids[0]!, { access: null, nowMs: Date.now() }))!.contents.netGrams).toBe(14_742)
        reads++
        await nextTurn()
      }
    }
    const post = async () => {
      for (let n = 0; !isOver; n++) {
        const [result] = await record(log.db, log.technician, [filledTo(ids[3 + n % 200]!, 30)])
        expect(result!.outcome).toBe('accepted')
      }
    }
    await Promise.all([watch(), post(), (async () => {
      try {
        await rebuildCaches(log.db, Date.now())
        await rebuildCaches(log.db, Date.now())
      }
      finally {
        isOver = true
      }
    })()])
    expect(reads).toBeGreaterThan(3)
    const live = await caches()
    await rebuildCaches(log.db, Date.now())
    expect(await caches()).toEqual(live)
  })

  it('goes on in a process beside one that records, and loses nothing of either', async () => {
    const ids = await someFleet(30)
    const beside = await log.openAgain()
    await log.db.write(['UPDATE movements SET grams = grams + 1'])
    let isOver = false
    const post = async () => {
      for (let n = 0; !isOver; n++) await record(log.db, log.technician, [sent(ids[n % 30]!, 'weighed', { gross: lb(30 + n % 5) })])
    }
    await Promise.all([post(), rebuildCaches(beside, Date.now()).finally(() => {
      isOver = true
    })])
    const live = await caches()
    await rebuildCaches(log.db, Date.now())
    expect(await caches()).toEqual(live)
  })

  it('by command works beside a server of the same version, and refuses beside another', async () => {
    await someFleet()
    await bringCachesToShape(log.db)
    const server = await holdDatabaseFile(log.file)
    const live = await caches()
    await log.db.write(['UPDATE cylinders SET net_grams = 7'])
    await runRebuild(`file:${log.file}`, resolve('drizzle/migrations'))
    expect(await caches()).toEqual(live)
    await log.db.write(['UPDATE meta SET value = \'0 older\' WHERE key = \'cache-shape\''])
    await expect(runRebuild(`file:${log.file}`, resolve('drizzle/migrations'))).rejects.toThrow('another version')
    server.close()
  })
})

describe('a database of an earlier version', () => {
  /** What an older fold would have left: a state without newer keys, halves it could not read, and no word of its shape. */
  async function makeOld() {
    await log.db.write([
      `UPDATE cylinders SET state = json_remove(state, '$.halves', '$.waitsForSignatureOf', '$.hasHeldBurnt', '$.standing', '$.labels')`,
      `UPDATE halves SET half = '{"old":true}'`, 'UPDATE movements SET grams = grams * 2', 'DELETE FROM stock_changes',
      'DELETE FROM meta WHERE key = \'cache-shape\'',
    ])
  }

  it('answers as the log has it once it has started, and says what it made', async () => {
    const ids = await someFleet()
    const live = await caches()
    await makeOld()
    await expect(cylinderView(log.db, ids[0]!, { access: null, nowMs: Date.now() })).rejects.toThrow()
    expect(await bringCachesToShape(log.db)).toBe(true)
    expect(await caches()).toEqual(live)
    expect((await cylinderView(log.db, ids[0]!, { access: null, nowMs: Date.now() }))!.contents.netGrams).toBe(14_742)
    expect(vi.mocked(console.log).mock.calls.flat().join('\n')).toContain('Made again: 4 cylinders from 10 events.')
    expect(await storedShape(log.db)).toBe(cacheShape())
    expect(await bringCachesToShape(log.db)).toBe(false)
  })

  it('begins again at the next start where a process ended halfway', async () => {
    await someFleet()
    const live = await caches()
    await makeOld()
    let turns = 0
    const dying: Database = { ...log.db, exclusive: work => ++turns > 1 ? Promise.reject(new Error('killed')) : log.db.exclusive(work) }
    await expect(bringCachesToShape(dying)).rejects.toThrow('killed')
    expect(await storedShape(log.db)).toBeNull()
    expect(await bringCachesToShape(log.db)).toBe(true)
    expect(await caches()).toEqual(live)
  })

  it('without a single event only learns its shape', async () => {
    expect(await bringCachesToShape(log.db)).toBe(false)
    expect(await storedShape(log.db)).toBe(cacheShape())
    expect(console.log).not.toHaveBeenCalled()
  })
})
