import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, it } from 'vitest'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { Health } from '../../utils/contract/firm'
import type { LogVerification } from '../../utils/contract/log'
import type { ProblemDetails } from '../../utils/contract/problem'
import { eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { idsSeenOutside, takeWriteLock } from '../helpers/otherProcess'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

/** Posts on their way at the same time. */
const AT_ONCE = 20
const POSTS = 1_000
/** The driver waits 50 ms for the lock, the server 6 s in all: between the two, and once beyond both. */
const HOLDS_MS = [120, 600, 1_500, 90, 7_500, 300, 200, 900, 60, 400]
const PAUSE_MS = 80

let server: TestServer
let shop: Shop
let cylinderIds: string[]
beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  cylinderIds = await Promise.all(Array.from({ length: 10 }, async () => (await registered(shop)).id))
})
afterAll(() => server?.stop())

/** Posts one weighing; answers what came back. */
async function weigh(cylinderId: string) {
  const event = { ...eventOf(cylinderId, 'weighed'), details: { gross: lb(40) } }
  const { status, body } = await shop.technician.client.post<EventsAnswer & ProblemDetails>('/api/events', { events: [event] })
  return { id: event.id, isAcknowledged: status === 200 && body.results[0]?.outcome === 'accepted', status, type: body.type }
}

it(`has in the file what it acknowledged of ${POSTS} posts while another process took the write lock again and again, and nothing else`, async () => {
  const locker = takeWriteLock(server.databaseFile, HOLDS_MS, PAUSE_MS)
  await locker.isHolding
  let isLocking = true
  const held = locker.ended.finally(() => isLocking = false)
  const answers: Awaited<ReturnType<typeof weigh>>[] = []
  const post = async () => {
    // On through the last hold, however fast the machine.
    while (answers.length < POSTS || isLocking) answers.push(await weigh(cylinderIds[answers.length % cylinderIds.length]!))
  }
  let slowestHealth = 0
  const watch = async () => {
    while (isLocking) {
      const asked = Date.now()
      await shop.admin.client.get<Health>('/api/health')
      slowestHealth = Math.max(slowestHealth, Date.now() - asked)
    }
  }
  const before = idsSeenOutside(server.databaseFile)
  await Promise.all([watch(), ...Array.from({ length: AT_ONCE }, post)])

  expect(await held).toBe(HOLDS_MS.length)
  const acknowledged = answers.filter(answer => answer.isAcknowledged).map(({ id }) => id)
  const seen = new Set(idsSeenOutside(server.databaseFile))
  for (const id of before) seen.delete(id)
  expect(acknowledged.filter(id => !seen.has(id))).toEqual([])
  expect(seen.size).toBe(acknowledged.length)
  // The hold beyond the server's patience is told as what it is; no other answer is neither of the two.
  const refused = answers.filter(answer => !answer.isAcknowledged)
  expect(new Set(refused.map(({ status, type }) => `${status} ${type}`))).toEqual(new Set(['503 database-unavailable']))
  expect(acknowledged.length).toBeGreaterThanOrEqual(POSTS - 2 * AT_ONCE)
  // A server that waited inside the driver would not answer for the whole of a hold.
  expect(slowestHealth).toBeLessThan(3_000)
  console.log(`${acknowledged.length} of ${answers.length} posts acknowledged, ${refused.length} answered 503; another process sees ${seen.size}`)
  const { body } = await shop.manager.client.get<LogVerification>('/api/log/verify')
  expect(body).toMatchObject({ ok: true, checked: before.length + acknowledged.length })
})

// Without what is tried above there would be nothing to guard against: the driver's own way, in a process of its own.
it('would lose what it acknowledged, had it gone on with the connection that met the lock', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'collarbook-lock-'))
  const file = join(folder, 'lost.db')
  try {
    const acknowledged = execFileSync(process.execPath, ['--input-type=module', '-e', `
      import { createClient } from '@libsql/client'
      const url = 'file:' + process.argv[1]
      const other = createClient({ url, timeout: 5000 })
      await other.execute('PRAGMA journal_mode = WAL')
      await other.execute('CREATE TABLE custody_events (id TEXT)')
      const client = createClient({ url, concurrency: 1, timeout: 0 })
      const lock = await other.transaction('write')
      await client.execute("INSERT INTO custody_events VALUES ('locked out')").catch(() => undefined)
      await lock.rollback()
      let acknowledged = 0
      for (let n = 0; n < 5; n++) acknowledged += (await client.execute({ sql: 'INSERT INTO custody_events VALUES (?)', args: [n] })).rowsAffected
      console.log(acknowledged)
      process.exit()
    `, file], { encoding: 'utf8' })
    expect([acknowledged.trim(), idsSeenOutside(file)]).toEqual(['5', []])
  }
  finally {
    rmSync(folder, { recursive: true })
  }
})
