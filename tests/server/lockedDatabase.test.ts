import { spawn, execFileSync } from 'node:child_process'
import { once } from 'node:events'
import { renameSync } from 'node:fs'
import { afterAll, beforeAll, expect, it } from 'vitest'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { Health } from '../../utils/contract/firm'
import type { ProblemDetails } from '../../utils/contract/problem'
import { eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

const LOCK_MS = 3_000

let server: TestServer
let shop: Shop
let cylinderId: string
beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  cylinderId = (await registered(shop)).id
})
afterAll(() => server?.stop())

// Other processes, always: locks of a file are a process's own, so a second client in this one would break what is tested.

/** Another process that holds the write lock for a while; resolves once it has it. */
async function holdWriteLock(ms: number): Promise<void> {
  const child = spawn(process.execPath, ['--input-type=module', '-e', `
    import { createClient } from '@libsql/client'
    const client = createClient({ url: 'file:' + process.argv[1], timeout: 5000 })
    const transaction = await client.transaction('write')
    console.log('held')
    setTimeout(() => transaction.rollback().then(() => process.exit(0)), ${ms})
  `, server.databaseFile], { stdio: ['ignore', 'pipe', 'inherit'] })
  await once(child.stdout, 'data')
}

/** How many of these events another process finds in the file. */
function seenOutside(ids: readonly string[]): number {
  return Number(execFileSync(process.execPath, ['--input-type=module', '-e', `
    import { createClient } from '@libsql/client'
    const client = createClient({ url: 'file:' + process.argv[1], timeout: 5000 })
    const { rows } = await client.execute({ sql: 'SELECT count(*) FROM custody_events WHERE id IN (SELECT value FROM json_each(?))', args: [process.argv[2]] })
    console.log(rows[0][0])
  `, server.databaseFile, JSON.stringify(ids)], { encoding: 'utf8' }))
}

/** Posts one weighing; answers its id once it is recorded, else the status that it was refused with. */
async function weigh(): Promise<string | number> {
  const event = { ...eventOf(cylinderId, 'weighed'), details: { gross: lb(40) } }
  const { status, body } = await shop.technician.client.post<EventsAnswer>('/api/events', { events: [event] })
  return status === 200 && body.results[0]?.outcome === 'accepted' ? event.id : status
}

it('has in the file what it answered while another process held the write lock, and stays answerable meanwhile', async () => {
  await holdWriteLock(LOCK_MS)
  const started = Date.now()
  let slowestHealth = 0
  const posts = Promise.all(Array.from({ length: 200 }, weigh))
  while (Date.now() - started < LOCK_MS - 500) {
    const asked = Date.now()
    expect((await shop.admin.client.get<Health>('/api/health')).body.ok).toBe(true)
    slowestHealth = Math.max(slowestHealth, Date.now() - asked)
  }
  const answers = await posts
  expect(Date.now() - started).toBeGreaterThan(LOCK_MS - 500)
  const recorded = answers.filter(answer => typeof answer === 'string')
  expect(recorded).toHaveLength(200)
  expect(seenOutside(recorded)).toBe(200)
  expect(slowestHealth).toBeLessThan(1_000)
  // Nothing that was answered afterwards may be lost either.
  const later = await Promise.all(Array.from({ length: 5 }, weigh))
  expect(seenOutside(later.map(String))).toBe(5)
})

it('takes nothing into a file that was moved away, says that it is not well, and goes on when the file is back', async () => {
  const elsewhere = `${server.folder}-moved`
  renameSync(server.folder, elsewhere)
  const refused = await shop.technician.client.post<ProblemDetails>('/api/events', { events: [{ ...eventOf(cylinderId, 'weighed'), details: { gross: lb(40) } }] })
  const unwell = await shop.admin.client.get<Health>('/api/health')
  renameSync(elsewhere, server.folder)
  expect(refused.status).toBe(503)
  expect(refused.body).toMatchObject({ type: 'database-unavailable', status: 503 })
  expect(unwell.status).toBe(503)
  expect(unwell.body).toMatchObject({ ok: false, database: 'unreachable' })
  expect(seenOutside([String(await weigh())])).toBe(1)
  expect((await shop.admin.client.get<Health>('/api/health')).body.ok).toBe(true)
})
