import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { MailAnswer, MailSentAnswer } from '../../utils/contract/mail'
import type { PapersAnswer, PapersMailAnswer } from '../../utils/contract/papers'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { ShipmentWithLines } from '../../utils/contract/shipments'
import type { CylinderView } from '../../utils/custody/cylinderView'
import type { ShipmentActsAnswer } from '../../utils/shipment/acts'
import { TestClient } from '../helpers/client'
import { made, openShop, registered, type Shop } from '../helpers/fleet'
import type { Member } from '../helpers/firm'
import { pdfTexts } from '../helpers/pdfText'
import { readied } from '../helpers/readyShipment'
import { mailServer } from '../helpers/receivedMail'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let firm: Shop
let reclaimer: { id: string }
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  reclaimer = await made(firm.admin.client, '/api/firms', { name: 'Tarnbeck Reclaim', kind: 'reclaimer', email: 'dock@tarnbeck.example', address: '9 Dock Road' })
})
afterAll(() => server.stop())

const act = () => ({ id: randomUUID(), occurredAt: new Date().toISOString() })

function draft(cylinders: CylinderView[], to = reclaimer.id): Promise<ShipmentWithLines> {
  return made(firm.warehouse.client, '/api/shipments', { toFirmId: to, cylinderIds: cylinders.map(one => one.id) })
}

/** A shipment that has left with these cylinders, 40.0 lb each. */
async function sent(cylinders: CylinderView[], to?: string): Promise<ShipmentWithLines> {
  const { id } = await draft(cylinders, to)
  const { lines } = await readied(firm.warehouse.client, id, cylinders.map(one => ({ cylinderId: one.id, gross: lb(40) })))
  const answer = await firm.manager.client.post<ShipmentWithLines>(`/api/shipments/${id}/dispatch`, {
    occurredAt: new Date().toISOString(),
    lines: lines.map(line => ({ cylinderId: line.cylinder.id, eventId: randomUUID(), expects: line.version, gross: lb(40) })),
  })
  expect(answer.status).toBe(200)
  return answer.body
}

async function printed(by: Member, shipmentId: string, file: string, at = server) {
  const cookie = [...by.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
  const answer = await fetch(`${at.baseUrl}/api/shipments/${shipmentId}/${file}`, { headers: { cookie } })
  return { status: answer.status, type: answer.headers.get('content-type'), pdf: Buffer.from(await answer.arrayBuffer()) }
}

const papersOf = async (id: string) => (await firm.auditor.client.get<PapersAnswer>(`/api/shipments/${id}/papers`)).body
const readOn = (pdf: Buffer) => pdfTexts(pdf).join(' ').replaceAll('\n', ' ').replaceAll('\u00A0', ' ')

describe('the papers of a shipment', () => {
  it('are a draft that says so until it leaves, and then stay as they were', async () => {
    const cylinder = await registered(firm)
    const shipment = await draft([cylinder])
    const before = await papersOf(shipment.id)
    expect(before).toMatchObject({ isDraft: true, papers: { number: shipment.number, shipper: { name: 'Quillfen Cooling' }, consignee: { name: 'Tarnbeck Reclaim' } } })
    expect(before.papers.groups[0]).toMatchObject({ description: { text: 'UN1018, Refrigerant gas R 22, 2.2' }, cylinders: 1, grossGrams: null })
    const { status, type, pdf } = await printed(firm.auditor, shipment.id, 'papers.pdf')
    expect([status, type]).toEqual([200, 'application/pdf'])
    expect(readOn(pdf)).toContain('DRAFT, not for the road')

    await firm.warehouse.client.post(`/api/shipments/${shipment.id}/cancel`, { ...act(), reason: 'Another one takes it' })
    const left = await sent([cylinder, await registered(firm)])
    // 40.0 lb each: 80.0 lb gross; 40.0 - 27.5 = 12.5 lb each: 25.0 lb net.
    for (const file of ['papers.pdf', 'packing-list.pdf']) {
      const text = readOn((await printed(firm.auditor, left.id, file)).pdf)
      expect(text).not.toContain('DRAFT')
      for (const said of ['80.0 lb', '25.0 lb', 'Tarnbeck Reclaim', 'Page 1 of']) expect(text).toContain(said)
    }
    const frozen = await papersOf(left.id)
    expect(frozen).toMatchObject({ isDraft: false, papers: { emergency: { telephone: '+1 555 0142' }, carriage: { by: 'own-vehicle' } } })
    await firm.admin.client.patch('/api/firm', { emergencyTelephone: '+1 555 0199' })
    expect(await papersOf(left.id)).toEqual(frozen)
    await firm.admin.client.patch('/api/firm', { emergencyTelephone: '+1 555 0142' })
    expect((await printed(firm.technician, left.id, 'papers.pdf')).status).toBe(403)
    expect((await firm.auditor.client.get(`/api/shipments/${randomUUID()}/papers`)).status).toBe(404)
    expect((await firm.auditor.client.get(`/api/shipments/${shipment.id}/papers`)).status).toBe(409)
  })

  it('wait for the shipper where the contents are not known, and count its word for these contents only', async () => {
    const cylinder = await registered(firm, { contents: 'unknown', gross: lb(40) })
    const shipment = await draft([cylinder])
    const path = `/api/shipments/${shipment.id}/lines/${cylinder.id}/classification`
    expect((await papersOf(shipment.id)).papers.missing).toMatchObject([{ code: 'not-classified', cylinderId: cylinder.id }])
    await firm.warehouse.client.post(`/api/shipments/${shipment.id}/weighings`, { ...act(), ref: cylinder.id, gross: lb(40) })
    await firm.warehouse.client.post(`/api/shipments/${shipment.id}/carrier`, { ...act(), carrierId: null })
    const refused = await firm.warehouse.client.post<ProblemDetails>(`/api/shipments/${shipment.id}/ready`, act())
    expect(refused.status).toBe(409)
    expect(JSON.stringify(refused.body)).toContain('Not classified')

    const classification = { identification: 'UN1078', technicalNames: ['chlorodifluoromethane', '1,1,1,2-tetrafluoroethane'], reason: 'as analysed' }
    const body = { ...act(), classification }
    expect((await firm.technician.client.put(path, body)).status).toBe(403)
    expect((await firm.warehouse.client.put(path, { ...act(), classification: { ...classification, reason: null } })).status).toBe(422)
    expect((await firm.warehouse.client.put(path, { ...act(), classification: { ...classification, technicalNames: [] } })).status).toBe(400)
    expect((await firm.warehouse.client.put(path, { ...act(), classification: { ...classification, identification: 'UN1018' } })).status).toBe(400)
    const said = await firm.warehouse.client.put<PapersAnswer>(path, body)
    expect(said.body.papers.missing).toEqual([])
    expect(said.body.papers.groups[0]!.description.text).toBe('UN1078, Refrigerant gases, n.o.s. (chlorodifluoromethane, 1,1,1,2-tetrafluoroethane), 2.2')
    expect((await firm.warehouse.client.put(path, body)).body).toEqual(said.body)
    const other = (await firm.auditor.client.get<ShipmentActsAnswer>(`/api/shipments/${shipment.id}/acts`)).body.items.find(({ kind }) => kind === 'weighed')!
    expect((await firm.warehouse.client.put(path, { ...act(), id: other.id, classification: null })).status).toBe(409)
    const tag = await printed(firm.auditor, shipment.id, 'contents-tags.pdf')
    expect(readOn(tag.pdf)).toContain('UN1078')
    expect(readOn(tag.pdf)).toContain('tetrafluoroethane')

    // Taken back, and a late repeat of the first word does not bring it back.
    expect((await firm.warehouse.client.put<PapersAnswer>(path, { ...act(), classification: null })).body.papers.missing).toHaveLength(1)
    expect((await firm.warehouse.client.put<PapersAnswer>(path, body)).body.papers.missing).toHaveLength(1)
    await firm.warehouse.client.put(path, { ...act(), classification })
    expect((await firm.warehouse.client.post(`/api/shipments/${shipment.id}/ready`, act())).status).toBe(200)

    const acts = (await firm.auditor.client.get<ShipmentActsAnswer>(`/api/shipments/${shipment.id}/acts`)).body.items
    const inWords = 'UN1078 (chlorodifluoromethane, 1,1,1,2-tetrafluoroethane): as analysed'
    expect(acts.flatMap(({ kind, details }) => kind === 'classified' ? [details['what']] : [])).toEqual([inWords, 'taken back', inWords])
    expect((await firm.warehouse.client.put(`/api/shipments/${shipment.id}/lines/${randomUUID()}/classification`, { ...act(), classification })).status).toBe(404)
  })
})

describe('the papers by mail', () => {
  it('stay inside without a mail server, go out once one is set, with both papers, and are told where they fail', async () => {
    const shipment = await sent([await registered(firm)])
    const path = `/api/shipments/${shipment.id}/papers/mail`
    const letter = { ...act(), note: 'Gate 4, before noon' }
    const kept = await firm.manager.client.post<PapersMailAnswer>(path, letter)
    expect([kept.status, kept.body]).toEqual([200, { mail: 'kept', recipient: 'dock@tarnbeck.example' }])
    expect((await firm.warehouse.client.post(path, { ...act() })).status).toBe(403)
    expect((await firm.manager.client.post(path, letter)).body).toEqual(kept.body)
    expect((await firm.manager.client.post(path, { ...letter, to: 'other@tarnbeck.example' })).body).toEqual(kept.body)
    const another = await sent([await registered(firm)])
    expect((await firm.manager.client.post(`/api/shipments/${another.id}/papers/mail`, letter)).status).toBe(409)
    const invitation = (await firm.admin.client.get<MailAnswer>('/api/mail')).body.items.find(({ recipient }) => recipient === firm.auditor.email)!
    expect((await firm.manager.client.post(path, { ...letter, id: invitation.id })).status).toBe(409)
    const inside = (await firm.admin.client.get<MailAnswer>('/api/mail')).body
    expect(inside.hasServer).toBe(false)
    const [mine, ...others] = inside.items.filter(({ recipient }) => recipient === 'dock@tarnbeck.example')
    expect(others).toEqual([])
    const number = String(shipment.number).padStart(4, '0')
    const names = [`bill-of-lading-${number}.pdf`, `packing-list-${number}.pdf`]
    expect(mine).toMatchObject({ id: letter.id, sentAt: null, error: null, isWhole: true })
    expect(mine!.attachments.map(({ name }) => name)).toEqual(names)
    expect((await firm.admin.client.post<ProblemDetails>(`/api/mail/${letter.id}/send`)).status).toBe(409)

    const post = await mailServer(address => address.startsWith('bounce'))
    await server.kill()
    const mailing = await startServer({ folder: server.folder, env: { SMTP_URL: post.url, MAIL_FROM: 'cylinders@harbor.example' } })
    try {
      const [admin, manager] = await Promise.all([firm.admin, firm.manager].map(async ({ email, password }) => {
        const client = new TestClient(mailing.baseUrl)
        await client.signIn(email, password)
        return client
      })) as [TestClient, TestClient]
      expect((await manager.post(`/api/mail/${letter.id}/send`)).status).toBe(403)
      expect((await admin.post<MailSentAnswer>(`/api/mail/${letter.id}/send`)).body).toEqual({ mail: 'sent' })
      expect((await admin.post<MailSentAnswer>(`/api/mail/${letter.id}/send`)).status).toBe(409)
      expect((await manager.post<PapersMailAnswer>(path, letter)).body.mail).toBe('sent')

      // A server that starts signs a checkpoint, and mails it to the auditor.
      const [got, ...more] = post.received.filter(({ to }) => to.includes('dock@tarnbeck.example'))
      expect(more).toEqual([])
      expect(got).toMatchObject({ to: ['dock@tarnbeck.example'], from: 'cylinders@harbor.example', subject: `Quillfen Cooling: papers of shipment ${number}, 1 cylinder` })
      expect(got!.text).toContain('Gate 4, before noon')
      expect(got!.papers.map(({ name, type }) => [name, type])).toEqual(names.map(name => [name, 'application/pdf']))
      expect(readOn(got!.papers[0]!.content)).toContain('UN1018, Refrigerant gas R 22, 2.2')
      expect(readOn(got!.papers[1]!.content)).toContain('40.0 lb')
      const saved = await fetch(`${mailing.baseUrl}/api/mail/${letter.id}/attachments/1`, { headers: { cookie: [...admin.cookies].map(([name, value]) => `${name}=${value}`).join('; ') } })
      expect(saved.headers.get('content-disposition')).toContain(names[1]!)
      expect(Buffer.from(await saved.arrayBuffer()).equals(got!.papers[1]!.content)).toBe(true)
      expect((await manager.get(`/api/mail/${letter.id}/attachments/1`)).status).toBe(403)
      expect((await admin.get(`/api/mail/${letter.id}/attachments/2`)).status).toBe(404)

      const bounced = await manager.post<PapersMailAnswer>(path, { ...act(), to: 'bounce@tarnbeck.example' })
      expect(bounced.body).toEqual({ mail: 'failed', recipient: 'bounce@tarnbeck.example' })
      const failed = (await admin.get<MailAnswer>('/api/mail')).body.items[0]!
      expect(failed).toMatchObject({ recipient: 'bounce@tarnbeck.example', error: expect.stringContaining('No such mailbox') })
      expect(failed.attachments).toHaveLength(2)
      expect((await admin.post<MailSentAnswer>(`/api/mail/${failed.id}/send`)).body).toEqual({ mail: 'failed' })

      const acts = (await manager.get<ShipmentActsAnswer>(`/api/shipments/${shipment.id}/acts`)).body.items.filter(({ kind }) => kind === 'papers-mailed')
      expect(acts.map(({ details, by }) => [details['to'], by])).toEqual([['dock@tarnbeck.example', 'Mona'], ['bounce@tarnbeck.example', 'Mona']])
    }
    finally {
      await mailing.kill()
      await post.stop()
      await server.restart()
    }
  })

  it('are refused before it leaves, and where no address is known', async () => {
    const shipment = await draft([await registered(firm)])
    expect((await firm.manager.client.post(`/api/shipments/${shipment.id}/papers/mail`, act())).status).toBe(409)
    const left = await sent([await registered(firm)], firm.reclaimer.id)
    const refused = await firm.manager.client.post<ProblemDetails>(`/api/shipments/${left.id}/papers/mail`, act())
    expect(refused.status).toBe(422)
    expect(refused.body.errors).toMatchObject([{ path: 'to' }])
    expect((await firm.manager.client.post(`/api/shipments/${left.id}/papers/mail`, { ...act(), to: 'a@b.example, c@d.example' })).status).toBe(400)
  })
})
