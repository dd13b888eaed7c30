import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { ProblemDetails } from '../../utils/contract/problem'
import { cylinderNow, eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let shop: Shop

beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
})
afterAll(() => server?.stop())

describe('events that are sent under their author\'s name', () => {
  it('are recorded in the session of that person, and in nobody else\'s', async () => {
    const { id } = await registered(shop)
    const events = [{ ...eventOf(id, 'weighed'), details: { gross: lb(41) } }]
    const sent = { events, author: shop.technician.id }

    const refused = await shop.warehouse.client.post<ProblemDetails>('/api/events', sent)
    expect([refused.status, refused.body.type]).toEqual([403, 'not-its-author'])
    expect((await cylinderNow(shop.manager.client, id)).version).toBe(2)

    const taken = await shop.technician.client.post<EventsAnswer>('/api/events', sent)
    expect(taken.body.results).toMatchObject([{ outcome: 'accepted', version: 3 }])
    const again = await shop.technician.client.post<EventsAnswer>('/api/events', { ...sent, author: shop.technician.id.toUpperCase() })
    expect(again.body.results).toMatchObject([{ outcome: 'duplicate', version: 3 }])
    expect((await shop.technician.client.post('/api/events', { events: [{ ...events[0], id: randomUUID() }], author: 'Tina' })).status).toBe(400)
  })
})
