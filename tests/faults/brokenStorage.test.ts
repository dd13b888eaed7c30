import { mkdtempSync, renameSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { createClient } from '@libsql/client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { Health } from '../../utils/contract/firm'
import type { LogVerification } from '../../utils/contract/log'
import type { ProblemDetails } from '../../utils/contract/problem'
import { BOUND_BY_MODE, fillDisk, forbidWriting, makeReadOnly, MAY_MOUNT, ruinPage, withSmallDisk } from '../helpers/brokenStorage'
import { cylinderNow, eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { takeWriteLock } from '../helpers/otherProcess'
import { startServer, type StartOptions, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

/** A health that a failed write made bad is tried anew after ten seconds. */
const WELL_AGAIN_MS = 20_000

/** A firm at its server, with one cylinder, and the ids of the events that were acknowledged. */
interface Site { server: TestServer, shop: Shop, cylinderId: string, acknowledged: Set<string> }

async function openSite(options: StartOptions): Promise<Site> {
  const server = await startServer(options)
  const shop = await openShop(server)
  return { server, shop, cylinderId: (await registered(shop)).id, acknowledged: new Set() }
}

/** Posts one weighing, or sends one again. */
async function weigh({ shop, cylinderId, acknowledged }: Site, event: { id: string } = { ...eventOf(cylinderId, 'weighed'), details: { gross: lb(40) } } as { id: string }) {
  const { status, headers, body } = await shop.technician.client.post<EventsAnswer & ProblemDetails>('/api/events', { events: [event] })
  const outcome = body.results?.[0]?.outcome ?? null
  if (outcome !== null && outcome !== 'refused') acknowledged.add(event.id)
  return { event, status, outcome, type: headers.get('content-type'), problem: body as ProblemDetails }
}

async function health({ shop }: Site): Promise<[number, Health]> {
  const { status, body } = await shop.admin.client.get<Health>('/api/health')
  return [status, body]
}

/** While the storage is broken each post is answered 503 with problem details, and the health agrees. Answers what was sent. */
async function expectUnavailable(site: Site, detail = /Nothing was stored/): Promise<{ id: string }[]> {
  const answers = await Promise.all(Array.from({ length: 5 }, () => weigh(site)))
  answers.push(await weigh(site))
  for (const { status, type, problem } of answers) {
    expect([status, type]).toEqual([503, 'application/problem+json'])
    expect(problem).toMatchObject({ type: 'database-unavailable', status: 503, detail: expect.stringMatching(detail) })
  }
  expect(await health(site)).toMatchObject([503, { ok: false, database: 'unreachable' }])
  return answers.map(({ event }) => event)
}

/** The server goes on: what was not acknowledged is sent again and stored, once; nothing acknowledged is missing. */
async function expectWellAgain(site: Site, refused: readonly { id: string }[]): Promise<void> {
  for (const event of refused) expect(await weigh(site, event)).toMatchObject({ status: 200, outcome: 'accepted' })
  expect(await health(site)).toMatchObject([200, { ok: true, database: 'ok' }])
  const { body } = await site.shop.manager.client.get<LogVerification>('/api/log/verify')
  // The cylinder was registered and labelled before.
  expect(body).toMatchObject({ ok: true, checked: 2 + site.acknowledged.size })
}

describe('a server whose storage breaks', () => {
  let site: Site
  let file: string
  beforeAll(async () => {
    site = await openSite({ by: BOUND_BY_MODE })
    file = site.server.databaseFile
  })
  afterAll(() => site?.server.stop())

  it('answers each post 503 while no file of it may grow, and goes on when one may', async () => {
    expect(await weigh(site)).toMatchObject({ status: 200, outcome: 'accepted' })
    const lift = forbidWriting(site.server)
    const refused = await expectUnavailable(site)
    lift()
    await expectWellAgain(site, refused)
  })

  it('is well again by itself, without a post', async () => {
    const lift = forbidWriting(site.server)
    await expectUnavailable(site)
    lift()
    await expect.poll(async () => (await health(site))[0], { timeout: WELL_AGAIN_MS, interval: 500 }).toBe(200)
  })

  it('answers each post 503 while the folder of its database is elsewhere, and goes on when it is back', async () => {
    const { folder } = site.server
    renameSync(folder, `${folder}-moved`)
    const refused = await expectUnavailable(site)
    renameSync(`${folder}-moved`, folder)
    await expectWellAgain(site, refused)
  })

  it('answers each post 503 where its file has become read-only, and goes on when it may write again', async () => {
    // A connection goes on with the file as it was opened: it meets the change when it is made anew, here because of a lock.
    const locker = takeWriteLock(file, [2_000])
    await locker.isHolding
    const lift = makeReadOnly(file)
    const refused = await expectUnavailable(site)
    await locker.ended
    lift()
    await expectWellAgain(site, refused)
  })

  it('only answers what is asked where it was started on a read-only file, and goes on when it may write', async () => {
    await site.server.kill()
    const lift = makeReadOnly(file)
    await site.server.restart()
    const refused = await expectUnavailable(site)
    expect(await cylinderNow(site.shop.technician.client, site.cylinderId)).toMatchObject({ version: 2 + site.acknowledged.size })
    lift()
    await expectWellAgain(site, refused)
  })

  it('answers each post 503 where a page of the log is ruined, and goes on after a new start with the page put back', async () => {
    const outside = createClient({ url: `file:${file}`, timeout: 5_000 })
    const first = async (sql: string) => (await outside.execute(sql)).rows[0]![0] as number
    // So that the page is read from the file, not from the write-ahead log, and not from what a connection remembers.
    expect(await first('PRAGMA wal_checkpoint(TRUNCATE)')).toBe(0)
    const restore = ruinPage(file, await first('SELECT rootpage FROM sqlite_schema WHERE name = \'custody_events\''), await first('PRAGMA page_size'))
    await outside.execute('UPDATE firm SET name = name')
    outside.close()
    const refused = await expectUnavailable(site)
    await site.server.kill()
    restore()
    await site.server.restart()
    await expectWellAgain(site, refused)
  })
})

describe.runIf(MAY_MOUNT)('a server whose disk is full', () => {
  let site: Site
  beforeAll(async () => {
    const folder = mkdtempSync(join(tmpdir(), 'collarbook-disk-'))
    site = await openSite({ folder, by: withSmallDisk(folder, 24) })
  })
  afterAll(() => site?.server.stop())

  it('says so to each post, and goes on once there is room', async () => {
    const makeRoom = fillDisk(site.server)
    // What fits into pages that are there already may still be stored.
    for (let n = 0; n < 200 && (await weigh(site)).status === 200; n++) await wait(1)
    const refused = await expectUnavailable(site, /disk of the server is full/)
    makeRoom()
    await expectWellAgain(site, refused)
  })
})
