import { setTimeout as wait } from 'node:timers/promises'
import { createClient } from '@libsql/client'
import { afterAll, beforeAll, expect, it } from 'vitest'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { LogVerification } from '../../utils/contract/log'
import type { TestClient } from '../helpers/client'
import { eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

const PHONES = 12
const KILLS = 4

let server: TestServer
let shop: Shop
beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
})
afterAll(() => server?.stop())

/** A phone that records weighings one after another, and sends each again until it is answered. */
function phone(client: TestClient, cylinderId: string) {
  const recorded: string[] = []
  let repeated = 0
  let isOn = true

  async function deliver(event: { id: string, details: object }): Promise<void> {
    for (;;) {
      const answer = await client.post<EventsAnswer>('/api/events', { events: [event] }).catch(() => null)
      const outcome = answer?.status === 200 ? answer.body.results[0]?.outcome : null
      if (outcome === 'accepted' || outcome === 'duplicate') {
        recorded.push(event.id)
        if (outcome === 'duplicate') repeated++
        return
      }
      if (answer) throw new Error(`A phone was answered ${answer.status}: ${JSON.stringify(answer.body)}`)
      await wait(20)
    }
  }
  async function work(): Promise<void> {
    while (isOn) await deliver({ ...eventOf(cylinderId, 'weighed'), details: { gross: lb(40) } })
  }

  const ended = work()
  return {
    recorded,
    repeated: () => repeated,
    switchOff() {
      isOn = false
      return ended
    },
  }
}

it('keeps every weighing that it answered, each once, where the server is killed in the middle of them', async () => {
  const cylinders = await Promise.all(Array.from({ length: PHONES / 2 }, () => registered(shop)))
  // Two phones to a cylinder.
  const phones = Array.from({ length: PHONES }, (_, index) => phone(shop.technician.client, cylinders[index % cylinders.length]!.id))
  for (let kill = 0; kill < KILLS; kill++) {
    await wait(300 + 37 * kill)
    await server.restart()
  }
  await wait(200)
  await Promise.all(phones.map(one => one.switchOff()))

  const answered = phones.flatMap(one => one.recorded)
  const database = createClient({ url: `file:${server.databaseFile}`, timeout: 5000 })
  const { rows } = await database.execute('SELECT id, cylinder_id, version FROM custody_events WHERE kind = \'weighed\' ORDER BY cylinder_id, version')
  const integrity = await database.execute('PRAGMA integrity_check')
  database.close()
  expect(answered.length).toBeGreaterThan(PHONES * KILLS)
  expect(rows.map(row => row[0]).sort()).toEqual([...answered].sort())
  expect(integrity.rows.map(row => row[0])).toEqual(['ok'])
  // Each cylinder was registered and labelled before: versions 1 and 2.
  for (const { id } of cylinders) {
    const versions = rows.filter(row => row[1] === id).map(row => row[2])
    expect(versions).toEqual(versions.map((_, index) => index + 3))
  }
  const { body } = await shop.manager.client.get<LogVerification>('/api/log/verify')
  expect(body).toMatchObject({ ok: true, checked: answered.length + 2 * cylinders.length })
  // A kill that left no answer outstanding for something stored would have proved nothing.
  expect(phones.reduce((sum, one) => sum + one.repeated(), 0)).toBeGreaterThan(0)
})
