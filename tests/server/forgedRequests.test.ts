import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { EventsAnswer, FleetAnswer } from '../../utils/contract/custody'
import type { LogVerification } from '../../utils/contract/log'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let shop: Shop
let cylinder: CylinderView
beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  cylinder = await registered(shop)
})
afterAll(() => server?.stop())

function inBase64(text: string): string {
  return Buffer.from(text).toString('base64url')
}

describe('a cursor that no answer gave', () => {
  const forged = [
    '!!!', 'x_y', '1e999_z', '1_2', '99999999999999999999_a', 'undefined', '__proto__', '\u0000',
    ...['nonsense', 'null', '{}', '[1]', '[null,null]', '[{"a":1},"x"]', '[1e999,"x"]', '["x",1]', '[1,"x","y"]'].map(inBase64),
  ]

  it('is refused as malformed by every list, and answered with no first page again', async () => {
    const lists = ['/api/cylinders', `/api/cylinders/${cylinder.id}/events`, '/api/shipments', '/api/test-lots'].map(path => ({ path, client: shop.manager.client }))
    for (const { path, client } of [...lists, { path: '/api/mail', client: shop.admin.client }]) {
      for (const cursor of forged) {
        const { status, body } = await client.get<ProblemDetails>(`${path}?cursor=${encodeURIComponent(cursor)}`)
        expect([status, body.errors], `${path} ${cursor}`).toEqual([400, [{ path: 'cursor', message: 'is none of ours' }]])
      }
    }
  })

  it('finds nothing more than its own text where it holds SQL', async () => {
    const cursor = inBase64(JSON.stringify(['code', 'asc', 1, 0, '~', 'x\' OR \'1\'=\'1']))
    const { status, body } = await shop.manager.client.get<FleetAnswer>(`/api/cylinders?sort=code&order=asc&cursor=${cursor}`)
    expect([status, body.items]).toEqual([200, []])
  })
})

describe('an event made to break the log', () => {
  /** The body as written by hand: not every one can be made from an object. */
  async function post(...events: string[]) {
    const response = await fetch(`${server.baseUrl}/api/events`, {
      method: 'POST', body: `{"events":[${events.join(',')}]}`,
      headers: { 'content-type': 'application/json', 'sec-fetch-site': 'same-origin', 'cookie': `collarbook=${shop.manager.client.session}` },
    })
    return { status: response.status, body: await response.json() as EventsAnswer }
  }
  const weighed = (more = {}) => JSON.stringify({ ...eventOf(cylinder.id, 'weighed'), ...more, details: { gross: lb(40) } })

  it('by a device named with half a character is refused alone, and the chains stay whole', async () => {
    const { status, body } = await post(weighed({ deviceId: '\uD800x' }), weighed({ deviceId: 'a\u0000b' }), weighed({ deviceId: 'phone \u{1F4F1}' }))
    expect([status, body.results.map(result => result.outcome)]).toEqual([200, ['refused', 'refused', 'accepted']])
    expect((await shop.manager.client.get<LogVerification>('/api/log/verify')).body.ok).toBe(true)
  })

  it('by a correction with a boundless number, or nested without end, is refused alone', async () => {
    const correcting = (instead: string) => JSON.stringify({
      ...eventOf(cylinder.id, 'corrected'), expects: 99, details: { eventId: eventOf('', '').id, reason: 'misread', instead: 'INSTEAD' },
    }).replace('"INSTEAD"', instead)
    const { status, body } = await post(correcting('{"gross":1e999}'), correcting(`{"gross":${'['.repeat(60_000)}${']'.repeat(60_000)}}`), weighed())
    expect(status).toBe(200)
    expect(body.results.map(({ outcome, problem }) => [outcome, problem?.status])).toEqual([['refused', 400], ['refused', 400], ['accepted', undefined]])
  })
})

describe('other requests that no page of ours makes', () => {
  it('for what is not there are 404 with a query too', async () => {
    expect((await shop.manager.client.get('/api/nothing?x=1')).status).toBe(404)
  })

  it('may write an id in capitals', async () => {
    const { body } = await shop.manager.client.get<FleetAnswer>(`/api/cylinders?place=${shop.shop.id.toUpperCase()}`)
    expect(body.items.map(row => row.id)).toEqual([cylinder.id])
  })

  it('may not name anything with half a character', async () => {
    expect((await shop.admin.client.patch(`/api/places/${shop.shop.id}`, { name: 'North \uD800' })).status).toBe(400)
  })
})
