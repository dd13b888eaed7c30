import { randomUUID } from 'node:crypto'
import { request } from 'node:http'
import { gunzipSync } from 'node:zlib'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { DEMO_PASSWORD } from '../../server/utils/demo/cast'
import type { KitAnswer, KitFirm } from '../../utils/contract/kit'
import type { CylinderState } from '../../utils/custody/state'
import { view } from '../../utils/custody/view'
import { kitContext, kitNames } from '../../utils/kit/kitContext'
import { codesOnTwo } from '../../utils/kit/kitEntry'
import { unpackCylinder } from '../../utils/kit/packCylinder'
import { CATALOGUE } from '../../utils/refrigerant/allRefrigerants'
import { TestClient } from '../helpers/client'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { fillKitFleet } from '../helpers/kitFleet'
import { startServer, type TestServer } from '../helpers/server'

/** Everything that a phone gets, asked for until nothing more is to be had. */
async function wholeKit(client: TestClient, from: Record<string, unknown> = {}): Promise<{ states: Map<string, CylinderState>, firm: KitFirm & { tag: string } | null, last: KitAnswer }> {
  const states = new Map<string, CylinderState>()
  let firm: KitFirm & { tag: string } | null = null
  let query = from
  for (;;) {
    const { status, body } = await client.get<KitAnswer>(`/api/kit?${new URLSearchParams(query as Record<string, string>)}`)
    expect(status).toBe(200)
    for (const packed of body.cylinders) states.set(packed.i, unpackCylinder(packed))
    firm = body.firm ?? firm
    if (body.next === null && !body.more) return { states, firm, last: body }
    query = { since: body.seq, mark: body.mark, ...firm && { firm: firm.tag }, ...body.next && { after: body.next } }
  }
}

describe('a phone\'s copy of the demo firm', () => {
  let demo: TestServer
  beforeAll(async () => {
    demo = await startServer({ env: { COLLARBOOK_DEMO: '1' } })
  })
  afterAll(() => demo?.stop())

  it.each(['technician', 'manager'])('shows a %s every cylinder exactly as the server does', async (role) => {
    const client = new TestClient(demo.baseUrl)
    await client.signIn(`${role}@demo.example`, DEMO_PASSWORD)
    const { user } = (await client.get<{ user: { id: string, roles: [], trainee: boolean } }>('/api/session')).body
    const { states, firm } = await wholeKit(client)
    expect(states.size).toBeGreaterThan(150)
    const all = [...states.values()].sort((a, b) => a.id < b.id ? -1 : 1)
    const names = kitNames(firm!)
    for (const state of all) {
      const answer = await client.get<object>(`/api/cylinders/${state.id}`)
      const said = {
        codesOnTwo: codesOnTwo(state, all),
        otherHalves: all.flatMap(({ halves }) => halves.filter(({ otherId }) => otherId === state.id)),
      }
      const access = { personId: user.id, roles: user.roles, trainee: user.trainee }
      const shown = view(state, kitContext(firm!, names, CATALOGUE, said, { nowMs: Date.now(), access }))
      expect(JSON.stringify(shown)).toBe(JSON.stringify(answer.body))
    }
  })
})

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server?.stop())

describe('what a phone is sent', () => {
  const asked = (client: TestClient, query: object = {}) => client.get<KitAnswer>(`/api/kit?${new URLSearchParams({ ...query } as Record<string, string>)}`)

  it('is for whoever may read the fleet, and for nobody who is not signed in', async () => {
    for (const { client } of [firm.admin, firm.warehouse, firm.technician, firm.manager, firm.auditor]) expect((await asked(client)).status).toBe(200)
    expect((await asked(new TestClient(server.baseUrl))).status).toBe(401)
  })

  it('is, once the phone has everything, only what was touched since, and the firm only when something of it has changed', async () => {
    const [one, two] = [await registered(firm), await registered(firm)]
    const { firm: told, last, states } = await wholeKit(firm.technician.client)
    expect([states.has(one.id), states.has(two.id)]).toEqual([true, true])
    const here = { since: last.seq, mark: last.mark, firm: told!.tag }
    expect((await asked(firm.technician.client, here)).body).toEqual({ form: last.form, anew: false, seq: last.seq, mark: last.mark, cylinders: [], next: null, more: false })

    await posted(firm.technician.client, [{ ...eventOf(two.id, 'moved'), details: { toPlaceId: firm.shop.id, toHolderId: firm.technician.id } }])
    const { body } = await asked(firm.technician.client, here)
    expect(body.cylinders.map(unpackCylinder).map(({ id, holderId }) => [id, holderId])).toEqual([[two.id, firm.technician.id]])
    expect(body).toMatchObject({ seq: last.seq + 1, anew: false })
    expect(body.firm).toBeUndefined()

    await made(firm.admin.client, '/api/places', { name: 'Roof store', kind: 'rack' })
    await expect.poll(async () => (await asked(firm.technician.client, here)).body.firm?.places.map(({ name }) => name), { timeout: 10_000 }).toContain('Roof store')
  })

  it('begins anew where the phone has followed another log', async () => {
    const { last } = await wholeKit(firm.technician.client)
    expect((await asked(firm.technician.client, { since: last.seq, mark: '0000000000000000' })).body.anew).toBe(true)
    expect((await asked(firm.technician.client, { since: last.seq + 1, mark: last.mark })).body.anew).toBe(true)
    expect((await asked(firm.technician.client, { since: last.seq })).body.anew).toBe(true)
  })

  it('has no address of a person, whoever asks', async () => {
    const { firm: told } = await wholeKit(firm.admin.client)
    expect(told!.people.map(({ name }) => name)).toContain('Tina')
    expect(JSON.stringify(told)).not.toContain('@firm.example')
  })

  it('is refused where the question does not fit', async () => {
    for (const query of ['since=-1', 'since=x', 'mark=1', 'after=1', 'unknown=1']) expect((await firm.technician.client.get(`/api/kit?${query}`)).status).toBe(400)
  })

  it('comes by gzip to whoever takes it, else as it is', async () => {
    const plain = await sent(server, firm.technician.client, '/api/kit', 'identity')
    const squeezed = await sent(server, firm.technician.client, '/api/kit', 'br, gzip')
    const refused = await sent(server, firm.technician.client, '/api/kit', 'gzip;q=0')
    expect([plain.encoding, squeezed.encoding, refused.encoding]).toEqual([undefined, 'gzip', undefined])
    expect(JSON.parse(gunzipSync(squeezed.bytes).toString())).toEqual(JSON.parse(plain.bytes.toString()))
  })
})

describe('a fleet of 10,000', () => {
  beforeAll(async () => {
    await fillKitFleet(server.databaseFile, 10_000, {
      places: [firm.shop.id, ...Array.from({ length: 40 }, () => randomUUID())], holders: [firm.technician.id, ...Array.from({ length: 25 }, () => randomUUID())], owner: firm.reclaimer.id,
    })
  })

  it('comes to a phone in at most 2 MB, in parts that keep nobody else waiting', async () => {
    let bytes = 0
    let parts = 0
    let longestMs = 0
    const ids = new Set<string>()
    let query: Record<string, unknown> = {}
    for (;;) {
      const asking = sent(server, firm.technician.client, `/api/kit?${new URLSearchParams(query as Record<string, string>)}`, 'gzip')
      const at = performance.now()
      await firm.manager.client.get('/api/session')
      longestMs = Math.max(longestMs, performance.now() - at)
      const part = await asking
      const answer = JSON.parse(gunzipSync(part.bytes).toString()) as KitAnswer
      bytes += part.bytes.length
      parts++
      for (const { i } of answer.cylinders) ids.add(i)
      if (answer.next === null) break
      query = { since: answer.seq, mark: answer.mark, firm: answer.firm?.tag ?? query['firm'], after: answer.next }
    }
    console.log(`10,000 cylinders: ${bytes} bytes as sent in ${parts} parts; another question waited ${Math.round(longestMs)} ms at most`)
    expect(ids.size).toBeGreaterThanOrEqual(10_000)
    expect(bytes).toBeLessThanOrEqual(2_000_000)
    expect(bytes).toBeGreaterThan(500_000)
  })
})

/** An answer as it goes over the network. */
function sent(server: TestServer, client: TestClient, path: string, accepted: string): Promise<{ bytes: Buffer, encoding: string | undefined }> {
  return new Promise((done, fail) => {
    const cookie = [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
    request(server.baseUrl + path, { headers: { cookie, 'accept-encoding': accepted, 'sec-fetch-site': 'same-origin' } }, (response) => {
      const parts: Buffer[] = []
      response.on('data', (part: Buffer) => parts.push(part))
      response.on('end', () => done({ bytes: Buffer.concat(parts), encoding: response.headers['content-encoding'] }))
    }).on('error', fail).end()
  })
}
