import { randomUUID } from 'node:crypto'
import { createClient } from '@libsql/client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { sealedToken } from '../../server/utils/dock/sealedToken'
import type { DockAnswer, DockEntriesAnswer, DockLinksAnswer, NewDockLinkAnswer } from '../../utils/contract/dock'
import type { MailAnswer } from '../../utils/contract/mail'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { ShipmentWithLines } from '../../utils/contract/shipments'
import type { UploadAnswer } from '../../utils/contract/uploads'
import { dockLines } from '../../utils/dock/dockLines'
import type { DockKind, DockSaid } from '../../utils/dock/entry'
import type { ShipmentActsAnswer } from '../../utils/shipment/acts'
import { TestClient, type Answer } from '../helpers/client'
import { made, openShop, registered, type Shop } from '../helpers/fleet'
import { redAndBlue } from '../helpers/pictures'
import { readied } from '../helpers/readyShipment'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let firm: Shop
/** Somebody at the dock: nobody who is signed in. */
let dock: TestClient
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  dock = new TestClient(server.baseUrl)
})
afterAll(() => server.stop())

interface Sent { id: string, cylinderIds: string[] }

/** A shipment on its way, each cylinder at 39.0 lb. */
async function sentOff(many = 1): Promise<Sent> {
  const cylinders = []
  for (let at = 0; at < many; at++) cylinders.push(await registered(firm))
  const { id } = await made<ShipmentWithLines>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: cylinders.map(one => one.id) })
  await readied(firm.warehouse.client, id, cylinders.map(one => ({ cylinderId: one.id, gross: lb(39) })))
  const left = await firm.manager.client.post(`/api/shipments/${id}/dispatch`, {
    occurredAt: new Date().toISOString(),
    lines: cylinders.map(one => ({ cylinderId: one.id, eventId: randomUUID(), expects: one.version, gross: lb(39) })),
  })
  if (left.status !== 200) throw new Error(`It did not leave: ${JSON.stringify(left.body)}`)
  return { id, cylinderIds: cylinders.map(one => one.id) }
}

interface Linked { id: string, token: string }

async function linkTo(shipmentId: string, more: object = {}): Promise<Linked & NewDockLinkAnswer> {
  const answer = await made<NewDockLinkAnswer>(firm.manager.client, `/api/shipments/${shipmentId}/dock-links`, { id: randomUUID(), forWhom: 'Dock 2', ...more })
  return { ...answer, id: answer.link.id, token: tokenOf(answer) }
}

const tokenOf = ({ url }: NewDockLinkAnswer) => new URL(url).pathname.slice('/d/'.length)
const at = (token: string) => `/api/dock/${token}`
const opens = (token: string) => dock.get<DockAnswer & ProblemDetails>(at(token))
const makes = (kind: DockKind, said: object, id: string = randomUUID()) => ({ id, kind, name: 'Dana', at: new Date().toISOString(), said })

function says(token: string, shipmentId: string, ...entries: object[]) {
  return dock.post<DockEntriesAnswer & ProblemDetails>(`${at(token)}/shipments/${shipmentId}/entries`, { deviceNow: new Date().toISOString(), entries })
}

async function said<Kind extends DockKind>(token: string, shipmentId: string, kind: Kind, what: Partial<DockSaid[Kind]>): Promise<string> {
  const entry = makes(kind, what)
  const { body } = await says(token, shipmentId, entry)
  if (body.results?.[0]?.outcome !== 'accepted') throw new Error(`It was not taken: ${JSON.stringify(body)}`)
  return entry.id
}

const outcomes = ({ body }: Answer<DockEntriesAnswer>) => body.results.map(result => result.outcome === 'refused' ? result.problem.title : result.outcome)
const shown = async (id: string) => (await firm.auditor.client.get<ShipmentWithLines>(`/api/shipments/${id}`)).body
const history = async (id: string) => (await firm.auditor.client.get<ShipmentActsAnswer>(`/api/shipments/${id}/acts`)).body.items
const NOTHING = { status: 404, title: 'This link opens nothing', type: 'link-unknown' }

describe('a link to the dock', () => {
  it('is made by whoever may dispatch, and by nobody else', async () => {
    const { id } = await sentOff()
    for (const { client } of [firm.warehouse, firm.technician, firm.auditor, firm.admin]) {
      expect((await client.post(`/api/shipments/${id}/dock-links`, { id: randomUUID(), forWhom: 'Dock' })).status).toBe(403)
    }
    const { link } = await linkTo(id)
    expect((await firm.warehouse.client.post(`/api/shipments/${id}/dock-links/${link.id}/revoke`, {})).status).toBe(403)
    expect((await dock.post(`/api/shipments/${id}/dock-links`, { id: randomUUID(), forWhom: 'Dock' })).status).toBe(401)
    expect((await firm.technician.client.get(`/api/shipments/${id}/dock-links`)).status).toBe(403)
    expect((await firm.manager.client.post(`/api/shipments/${id}/dock-links`, { id: randomUUID(), forWhom: 'Dock', days: 31 })).status).toBe(400)
    expect((await firm.manager.client.post(`/api/shipments/${randomUUID()}/dock-links`, { id: randomUUID(), forWhom: 'Dock' })).status).toBe(404)
    const draft = await made<ShipmentWithLines>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id })
    expect((await firm.manager.client.post(`/api/shipments/${draft.id}/dock-links`, { id: randomUUID(), forWhom: 'Dock' })).status).toBe(409)
  })

  it('is the same when its making is sent twice, and good for 30 days unless it is said', async () => {
    const { id } = await sentOff()
    const body = { id: randomUUID(), forWhom: 'Dock 2' }
    const [first, second] = [await made<NewDockLinkAnswer>(firm.manager.client, `/api/shipments/${id}/dock-links`, body), await made<NewDockLinkAnswer>(firm.manager.client, `/api/shipments/${id}/dock-links`, body)]
    expect(second.url).toBe(first.url)
    expect(Math.round((Date.parse(first.link.expiresAt) - Date.now()) / 86_400_000)).toBe(30)
    const { items } = (await firm.auditor.client.get<DockLinksAnswer>(`/api/shipments/${id}/dock-links`)).body
    expect(items).toMatchObject([{ forWhom: 'Dock 2', createdBy: 'Mona', state: 'open', firstUsedAt: null, entries: 0 }])
    expect((await history(id)).filter(({ kind }) => kind === 'link-made')).toHaveLength(1)
  })

  it('shows the one shipment to anybody who has it, without a weight of ours', async () => {
    const { id, cylinderIds } = await sentOff(2)
    const { token } = await linkTo(id)
    const { status, body, headers } = await opens(token)
    expect(status).toBe(200)
    expect(body).toMatchObject({ shipment: { id, state: 'dispatched' }, closed: null, from: { name: 'Quillfen Cooling', telephone: '555-0100' }, to: { name: 'Tarnvale Reclaim' }, link: { forWhom: 'Dock 2' }, entries: [] })
    expect(body.cylinders.map(one => [one.cylinderId, one.refrigerant, one.ourGross])).toEqual(cylinderIds.map(one => [one, 'R-22', null]))
    // 39.0 lb = 17690 g; 11.5 lb net = 5216 g; TW 27.5 lb.
    expect(JSON.stringify(body)).not.toMatch(/17690|5216|\b39\b|netGrams|grossGrams/)
    expect(Object.fromEntries(['referrer-policy', 'cache-control', 'x-robots-tag', 'set-cookie'].map(name => [name, headers.get(name)]))).toEqual({
      'referrer-policy': 'no-referrer', 'cache-control': 'no-store', 'x-robots-tag': 'noindex, nofollow', 'set-cookie': null,
    })
  })

  it('opens nothing with one character changed, left out or added, and says the same of each', async () => {
    const { id } = await sentOff()
    const { token } = await linkTo(id)
    const same = (await opens(`${'A'.repeat(60)}`)).body
    expect(same).toMatchObject(NOTHING)
    const others = [...token].flatMap((character, index) => {
      const put = (other: string) => token.slice(0, index) + other + token.slice(index + 1)
      return [put(character === 'A' ? 'B' : 'A'), put(''), put(`${character}A`), put('=')]
    })
    const odd = [`${token}=`, `${token}%00`, `${token}%20`, token.toLowerCase(), token.split('').reverse().join('')]
    await Promise.all([...others, ...odd].map(async (other) => {
      const { status, body } = await opens(other)
      expect([status, body], other).toEqual([404, same])
    }))
    expect((await opens(token)).status).toBe(200)
  })

  it('opens nothing that was signed by another key, and nothing once it was withdrawn, or has run out', async () => {
    const { id, cylinderIds } = await sentOff()
    const { token, link } = await linkTo(id)
    const same = (await opens('A'.repeat(60))).body
    const named = { linkId: link.id, expiresAt: Date.parse(link.expiresAt) }
    expect((await opens(sealedToken(named, 'another secret of thirty-two char'))).body).toEqual(same)

    const late = await linkTo(id)
    await inDatabase('UPDATE dock_links SET expires_at = ? WHERE id = ?', [Date.parse(late.link.expiresAt) + 1000, late.id])
    expect((await opens(late.token)).body).toEqual(same)
    const gone = await linkTo(id)
    await inDatabase('DELETE FROM dock_links WHERE id = ?', [gone.id])
    expect((await opens(gone.token)).body).toEqual(same)

    await said(token, id, 'here', { cylinderId: cylinderIds[0] })
    const revoked = await firm.manager.client.post<DockLinksAnswer>(`/api/shipments/${id}/dock-links/${link.id}/revoke`, {})
    expect(revoked.body.items.find(one => one.id === link.id)).toMatchObject({ state: 'revoked', revokedBy: 'Mona', entries: 1 })
    expect((await opens(token)).body).toEqual(same)
    expect((await says(token, id, makes('overdue', { cylinderId: cylinderIds[0] }))).body).toEqual(same)
    expect((await photo(token, randomUUID())).body).toEqual(same)
    expect((await history(id)).map(({ kind }) => kind)).toContain('link-revoked')
  })

  it('opens nothing from the second on in which it ends', async () => {
    const { id } = await sentOff()
    const link = await linkTo(id)
    const ends = Math.floor(Date.now() / 1000) * 1000
    await inDatabase('UPDATE dock_links SET expires_at = ? WHERE id = ?', [ends, link.id])
    expect((await opens(sealedToken({ linkId: link.id, expiresAt: ends }, SECRET))).body).toMatchObject(NOTHING)
    const later = ends + 60_000
    await inDatabase('UPDATE dock_links SET expires_at = ? WHERE id = ?', [later, link.id])
    expect((await opens(sealedToken({ linkId: link.id, expiresAt: later }, SECRET))).status).toBe(200)
  })

  it('opens nothing else: no other shipment, no other route, and not out of a query', async () => {
    const [mine, other] = [await sentOff(), await sentOff()]
    const { token } = await linkTo(mine.id)
    expect((await says(token, other.id, makes('here', { cylinderId: other.cylinderIds[0]! }))).body).toMatchObject(NOTHING)
    expect((await shown(other.id)).state).toBe('dispatched')
    for (const path of [`/api/shipments/${mine.id}`, `/api/shipments/${mine.id}/dock-links`, `/api/cylinders/${mine.cylinderIds[0]}`, '/api/session', '/api/firms']) {
      expect((await dock.get(`${path}?token=${token}`)).status, path).toBeGreaterThanOrEqual(400)
      expect((await dock.get(path, { authorization: `Bearer ${token}`, cookie: `collarbook=${token}` })).status, path).toBe(401)
    }
    for (const path of [`/api/dock?token=${token}`, `/api/dock/?token=${token}`, `/api/dock/x?token=${token}`]) expect((await dock.get(path)).status, path).toBe(404)
    expect((await dock.get(`${at(token)}/shipments`)).status).toBe(404)
    expect((await dock.get(`${at(token)}?more=1`)).status).toBe(400)
  })

  it('gives a person who is signed in nothing more', async () => {
    const [mine, other] = [await sentOff(), await sentOff()]
    const { token } = await linkTo(mine.id)
    const signedIn = firm.manager.client
    expect((await signedIn.get<DockAnswer>(at(token))).body.cylinders[0]!.ourGross).toBeNull()
    expect((await signedIn.get(at('A'.repeat(60)))).body).toMatchObject(NOTHING)
    const answer = await signedIn.post(`${at(token)}/shipments/${other.id}/entries`, { entries: [makes('here', { cylinderId: other.cylinderIds[0]! })] })
    expect(answer.body).toMatchObject(NOTHING)
  })

  it('stands neither in the database, nor in a letter that is kept, nor in what the server prints', async () => {
    const { id, cylinderIds } = await sentOff()
    const { token, mail } = await linkTo(id, { email: 'dock@tarnvale.example' })
    expect(mail).toBe('kept')
    const { items } = (await firm.admin.client.get<MailAnswer>('/api/mail')).body
    expect(items[0]).toMatchObject({ recipient: 'dock@tarnvale.example', body: expect.stringContaining('(told to the reader alone)') as string })
    await said(token, id, 'here', { cylinderId: cylinderIds[0] })
    await opens(`${token}x`)
    const tables = (await inDatabase('SELECT name FROM sqlite_schema WHERE type = \'table\' AND name NOT LIKE \'sqlite_%\'')).map(row => String(row['name']))
    for (const table of tables) expect(JSON.stringify(await inDatabase(`SELECT * FROM "${table}"`)), table).not.toContain(token)
    expect(server.output()).not.toContain(token)
  })

  it('is asked by HEAD and OPTIONS without a word, and answers no more than it can', async () => {
    const { id } = await sentOff()
    const { token } = await linkTo(id)
    for (const method of ['HEAD', 'OPTIONS', 'PUT', 'DELETE', 'PATCH']) {
      const [good, bad] = [await dock.send(method, at(token)), await dock.send(method, at('A'.repeat(60)))]
      expect(JSON.stringify(good.body ?? ''), method).not.toContain('Quillfen')
      expect(bad.status, method).toBe(404)
      expect(good.headers.get('access-control-allow-origin'), method).toBeNull()
    }
  })
})

describe('what is said at the dock', () => {
  it('has the shipment arrive with the first that is there, and shows our weight once theirs is entered', async () => {
    const { id, cylinderIds: [first, second] } = await sentOff(2)
    const { token, link } = await linkTo(id)
    await said(token, id, 'missing', { cylinderId: second })
    expect((await shown(id)).state).toBe('dispatched')
    await said(token, id, 'gross', { cylinderId: first, gross: lb(37.5) })
    expect((await shown(id)).state).toBe('arrived')
    const { body } = await opens(token)
    expect(body.cylinders.map(one => one.ourGross)).toEqual([lb(39), null])
    expect(dockLines(body.entries).get(first!)).toMatchObject({ here: true, theirGross: lb(37.5), by: 'Dana' })
    expect((await history(id)).slice(-3).map(act => [act.kind, act.by, act.isTheirs])).toEqual([
      ['dock-missing', 'Dana', true], ['arrived', 'Dana', true], ['dock-gross', 'Dana', true],
    ])
    expect((await firm.auditor.client.get<DockLinksAnswer>(`/api/shipments/${id}/dock-links`)).body.items[0]).toMatchObject({ id: link.id, entries: 2, lastEntryAt: expect.any(String) as string, firstUsedAt: expect.any(String) as string })
  })

  it('is kept once, however often it is sent, and otherwise refused under the same id', async () => {
    const { id, cylinderIds: [first] } = await sentOff()
    const { token } = await linkTo(id)
    const entries = [makes('here', { cylinderId: first }), makes('damaged', { cylinderId: first, what: 'dented collar' })]
    expect(outcomes(await says(token, id, ...entries))).toEqual(['accepted', 'accepted'])
    expect(outcomes(await says(token, id, ...entries))).toEqual(['duplicate', 'duplicate'])
    expect(outcomes(await says(token, id, { ...entries[0]!, kind: 'overdue' }))).toEqual(['Another entry has this id'])
    expect((await opens(token)).body.entries).toHaveLength(2)
  })

  it('comes from two phones at once, each once, and the shipment arrives once', async () => {
    const { id, cylinderIds } = await sentOff(4)
    const { token } = await linkTo(id)
    const shared = makes('here', { cylinderId: cylinderIds[0]! })
    const phones = await Promise.all(cylinderIds.flatMap(cylinderId => [
      says(token, id, shared, makes('here', { cylinderId })), says(token, id, shared, makes('gross', { cylinderId, gross: lb(39.1) })),
    ]))
    expect(phones.flatMap(outcomes).filter(outcome => outcome === 'duplicate')).toHaveLength(7)
    expect(phones.flatMap(outcomes).filter(outcome => outcome === 'accepted')).toHaveLength(9)
    expect((await history(id)).filter(({ kind }) => kind === 'arrived')).toHaveLength(1)
    expect([...dockLines((await opens(token)).body.entries).values()].every(line => line.here && line.theirGross?.unit === 'lb')).toBe(true)
  })

  it('tells nobody whether a cylinder exists that is not on the shipment', async () => {
    const [mine, other] = [await sentOff(), await sentOff()]
    const { token } = await linkTo(mine.id)
    const { body } = await says(token, mine.id, makes('here', { cylinderId: other.cylinderIds[0]! }), makes('here', { cylinderId: randomUUID() }), makes('here', { cylinderId: mine.cylinderIds[0]! }))
    const [known, unknown, right] = body.results
    expect(known).toMatchObject({ outcome: 'refused', problem: { status: 422, title: 'Not on this shipment' } })
    expect({ ...unknown, id: '' }).toEqual({ ...known, id: '' })
    expect(right!.outcome).toBe('accepted')
  })

  it('is taken out over its own link alone, and both stay in the history', async () => {
    const { id, cylinderIds: [first] } = await sentOff()
    const [mine, other] = [await linkTo(id), await linkTo(id, { forWhom: 'Dock 3' })]
    const entryId = await said(mine.token, id, 'gross', { cylinderId: first, gross: lb(1) })
    expect(outcomes(await says(other.token, id, makes('taken-out', { entryId }), makes('taken-out', { entryId: randomUUID() })))).toEqual(['Not yours to take out', 'Not yours to take out'])
    const takingOut = makes('taken-out', { entryId })
    expect(outcomes(await says(mine.token, id, takingOut))).toEqual(['accepted'])
    expect(outcomes(await says(mine.token, id, makes('taken-out', { entryId: takingOut.id })))).toEqual(['Not yours to take out'])
    const { body } = await opens(other.token)
    expect(dockLines(body.entries).has(first!)).toBe(false)
    expect(body.cylinders[0]!.ourGross).toBeNull()
    expect((await history(id)).map(({ kind }) => kind)).toEqual(expect.arrayContaining(['dock-gross', 'dock-taken-out']))
  })

  it('stands by when it was made, set right by the clock of the phone, and never in the future', async () => {
    const { id, cylinderIds: [first] } = await sentOff()
    const { token } = await linkTo(id)
    const hour = 3_600_000
    const ahead = (ms: number) => new Date(Date.now() + ms).toISOString()
    const entry = { ...makes('here', { cylinderId: first }), at: ahead(2 * hour) }
    await dock.post(`${at(token)}/shipments/${id}/entries`, { deviceNow: ahead(2 * hour), entries: [entry] })
    await says(token, id, { ...makes('overdue', { cylinderId: first }), at: ahead(hour) })
    await says(token, id, { ...makes('overdue', { cylinderId: first }), at: '1999-01-01T00:00:00Z' })
    for (const { at: instant } of (await opens(token)).body.entries) expect(Math.abs(Date.parse(instant) - Date.now())).toBeLessThan(60_000)
  })

  it('is refused where it is malformed, and none of a batch is kept then', async () => {
    const { id, cylinderIds: [first] } = await sentOff()
    const { token } = await linkTo(id)
    const good = makes('here', { cylinderId: first })
    for (const odd of [
      { ...good, said: { cylinderId: first, more: 1 } }, { ...good, name: '  ' }, { ...good, name: 'x'.repeat(81) }, { ...good, name: 'Da\u202Ena' },
      { ...good, kind: 'settled' }, { ...good, at: 'yesterday' }, { ...good, id: '1' }, { ...good, linkId: randomUUID() },
      makes('gross', { cylinderId: first, gross: lb(0) }), makes('gross', { cylinderId: first, gross: lb(-3) }), makes('gross', { cylinderId: first, gross: { unit: 'lb', value: 1e9 } }),
      makes('graded', { cylinderId: first }), makes('damaged', { cylinderId: first, what: '' }), makes('unexpected', { serial: '' }),
    ]) expect((await says(token, id, { ...good, id: randomUUID() }, odd)).status, JSON.stringify(odd)).toBe(400)
    expect((await says(token, id)).status).toBe(400)
    expect((await says(token, id, good, good)).status).toBe(400)
    expect((await says(token, id, ...Array.from({ length: 101 }, () => makes('here', { cylinderId: first })))).status).toBe(400)
    expect((await dock.post(`${at(token)}/shipments/${id}/entries`, { entries: [good], filler: 'x'.repeat(600_000) })).status).toBe(413)
    expect((await dock.post(`${at(token)}/shipments/${id}/entries`, { entries: [good] }, { 'sec-fetch-site': 'cross-site' })).status).toBe(403)
    expect((await dock.post(`${at(token)}/shipments/${id}/entries`, { entries: [good] }, { 'content-type': 'text/plain' })).status).toBe(415)
    expect((await opens(token)).body.entries).toEqual([])
  })

  it('is refused with the reason once the shipment is settled, while the link still shows it', async () => {
    const { id, cylinderIds: [first] } = await sentOff()
    const { token } = await linkTo(id)
    await said(token, id, 'here', { cylinderId: first })
    await inDatabase('UPDATE shipments SET state = \'settled\' WHERE id = ?', [id])
    const { body } = await says(token, id, makes('graded', { cylinderId: first, grade: 'A' }))
    expect(body.results).toMatchObject([{ outcome: 'refused', problem: { status: 409, type: 'dock-closed' } }])
    const { body: read } = await opens(token)
    expect(read.closed).toMatch(/settled/)
    expect(read.cylinders).toHaveLength(1)
    expect((await photo(token, randomUUID())).status).toBe(409)
  })

  it('is slowed down where one link asks without end', async () => {
    const { id } = await sentOff()
    const { token } = await linkTo(id)
    const statuses = (await Promise.all(Array.from({ length: 150 }, () => opens(token)))).map(({ status }) => status)
    expect(statuses.filter(status => status === 200).length).toBeGreaterThanOrEqual(120)
    expect(statuses).toContain(429)
    expect((await opens((await linkTo(id)).token)).status).toBe(200)
  })
})

describe('a photo from the dock', () => {
  it('is taken once an entry names it, drawn anew, and read by that link and by our people alone', async () => {
    const { id, cylinderIds: [first] } = await sentOff()
    const [mine, other] = [await linkTo(id), await linkTo(id, { forWhom: 'Dock 3' })]
    const photoId = randomUUID()
    expect((await photo(mine.token, photoId)).status).toBe(422)
    await said(mine.token, id, 'damaged', { cylinderId: first, what: 'bent valve', photoIds: [photoId] })
    expect((await photo(other.token, photoId)).status).toBe(422)
    expect(await photo<UploadAnswer>(mine.token, photoId)).toMatchObject({ status: 200, body: { id: photoId, width: 64, height: 32 } })
    expect((await photo(mine.token, photoId)).status).toBe(200)
    expect((await photo(mine.token, photoId, Buffer.from('<html>'))).status).toBe(415)

    const read = await dock.get(`${at(mine.token)}/photos/${photoId}`)
    expect([read.status, read.headers.get('content-type'), read.headers.get('cache-control')]).toEqual([200, 'image/jpeg', 'private, no-store'])
    expect((await dock.get(`${at(other.token)}/photos/${photoId}`)).status).toBe(404)
    expect((await dock.get(`/api/uploads/${photoId}`)).status).toBe(401)
    expect((await firm.auditor.client.get(`/api/uploads/${photoId}`)).status).toBe(200)
  })

  it('is no way to a photo of ours', async () => {
    const { id, cylinderIds: [first] } = await sentOff()
    const { token } = await linkTo(id)
    const ours = randomUUID()
    await upload(firm.technician.client, '/api/uploads', ours)
    await said(token, id, 'damaged', { cylinderId: first, what: 'look', photoIds: [ours] })
    expect((await dock.get(`${at(token)}/photos/${ours}`)).status).toBe(404)
    expect((await photo(token, ours)).status).toBe(409)
  })
})

describe('the page of a link', () => {
  it('is the same whatever the link, is named to nobody, and holds nothing of it', async () => {
    const { id } = await sentOff()
    const { token } = await linkTo(id)
    const page = await fetch(`${server.baseUrl}/d/${token}`)
    const text = await page.text()
    expect(page.status).toBe(200)
    expect(Object.fromEntries(['referrer-policy', 'x-robots-tag', 'cache-control'].map(name => [name, page.headers.get(name)]))).toEqual({
      'referrer-policy': 'no-referrer', 'x-robots-tag': 'noindex, nofollow', 'cache-control': 'no-store',
    })
    expect(text).not.toContain('Quillfen')
    expect(text).not.toContain(token)
  })
})

const SECRET = 'b7e1c94a5d20f3886a4e0c17d95f2b63'

async function inDatabase(sql: string, args: (string | number)[] = []) {
  const client = createClient({ url: `file:${server.databaseFile}` })
  try {
    return (await client.execute({ sql, args })).rows
  }
  finally {
    client.close()
  }
}

function photo<T = ProblemDetails>(token: string, id: string, file: Uint8Array = redAndBlue()): Promise<Answer<T>> {
  return upload<T>(dock, `${at(token)}/photos`, id, file)
}

async function upload<T>(client: TestClient, path: string, id: string, file: Uint8Array = redAndBlue()): Promise<Answer<T>> {
  const form = new FormData()
  form.append('id', id)
  form.append('file', new Blob([file as Uint8Array<ArrayBuffer>], { type: 'image/jpeg' }), 'photo.jpg')
  const body = new Response(form)
  return client.sendBytes<T>(path, Buffer.from(await body.arrayBuffer()), { 'content-type': body.headers.get('content-type')! })
}
