import { randomUUID } from 'node:crypto'
import { getPort } from 'get-port-please'
import { SMTPServer } from 'smtp-server'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { BankedAnswer } from '../../utils/contract/banked'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { JobAnswer, JobsAnswer, RecoveryNoteMailAnswer } from '../../utils/contract/jobs'
import type { KitAnswer } from '../../utils/contract/kit'
import type { MailAnswer } from '../../utils/contract/mail'
import type { FirmsAnswer } from '../../utils/contract/places'
import type { ProblemDetails } from '../../utils/contract/problem'
import { addMember, type Member } from '../helpers/firm'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { pdfTexts } from '../helpers/pdfText'
import { readied } from '../helpers/readyShipment'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let firm: Shop
let trainee: Member
let customerId: string
let post: SMTPServer
// What does not go out stays readable inside: the invitations are taken up from there.
const isRefused = (address: string) => address.startsWith('bounce') || address.endsWith('@harbor.example')
const received: { to: string[], text: string }[] = []

beforeAll(async () => {
  const port = await getPort({ host: '127.0.0.1', random: true })
  post = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onRcptTo: ({ address }, _session, callback) => callback(isRefused(address) ? new Error('No such mailbox') : undefined),
    onData(stream, session, callback) {
      let text = ''
      stream.on('data', data => text += data)
      stream.on('end', () => {
        received.push({ to: session.envelope.rcptTo.map(({ address }) => address), text })
        callback()
      })
    },
  })
  await new Promise<void>(done => post.listen(port, '127.0.0.1', done))
  server = await startServer({ env: { SMTP_URL: `smtp://127.0.0.1:${port}`, MAIL_FROM: 'cylinders@harbor.example' } })
  firm = await openShop(server)
  trainee = await addMember(firm.admin, 'Pia', ['technician'], { trainee: true })
  await firm.admin.client.patch(`/api/people/${firm.technician.id}`, { certificationType: 'II', certificationNumber: '4411' })
  customerId = (await made<{ id: string }>(firm.admin.client, '/api/firms', { name: 'Ossory Foods', kind: 'customer', email: 'plant@ossory.example' })).id
})
afterAll(async () => {
  await server?.stop()
  await new Promise<void>(done => post.close(done))
})

const said = (more: object = {}) => ({ customerId, site: '4 Quay Street', equipment: 'Chiller 2', refrigerant: 'r-22', charge: lb(30), keeps: 'customer', opened: { circumstances: 'major', machineMade: 'since-1993-11-15' }, ...more })
const newJob = (more: object = {}) => made<JobAnswer>(firm.technician.client, '/api/jobs', said(more))
const jobNow = async (id: string, by = firm.auditor) => (await by.client.get<JobAnswer>(`/api/jobs/${id}`)).body
const refused = async (by: Member, body: object) => (await by.client.post<ProblemDetails>('/api/jobs', body)).status

/** A fill of an evacuated cylinder (TW 27.5 lb) up to a gross. */
async function fill(jobId: string, grossLb: number, more: object = {}, by = firm.technician, envelope: object = {}) {
  const cylinder = await registered(firm, { contents: 'evacuated' })
  const event = {
    ...eventOf(cylinder.id, 'filled'), ...envelope,
    details: { refrigerant: 'R-22', grossBefore: lb(27.5), grossAfter: lb(grossLb), looked: true, jobId, ownerOfRefrigerantId: customerId, method: 'machine-liquid', ...more },
  }
  const [view] = await posted(by.client, [event])
  return { event, cylinder, view: view! }
}

async function noteText(id: string): Promise<{ pages: string[], name: string | null }> {
  const cookie = [...firm.technician.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
  const answer = await fetch(`${server.baseUrl}/api/jobs/${id}/recovery-note.pdf`, { headers: { cookie } })
  expect([answer.status, answer.headers.get('content-type')]).toEqual([200, 'application/pdf'])
  return { pages: pdfTexts(Buffer.from(await answer.arrayBuffer())).map(text => text.replaceAll('\u00A0', ' ')), name: answer.headers.get('content-disposition') }
}

describe('a job', () => {
  it('is made once, under an id of the phone\'s own, and is numbered', async () => {
    const id = randomUUID()
    const first = await made<JobAnswer>(firm.technician.client, '/api/jobs', { id, ...said() })
    expect(first).toMatchObject({
      id, customer: { id: customerId, name: 'Ossory Foods' }, email: 'plant@ossory.example', refrigerant: 'R-22', keeps: 'customer', createdBy: { name: 'Tina' }, fills: [], recoveredGrams: null, issue: 1, cautions: [],
      // R-22 is of high pressure; under 200 lb the table asks for 0 inHg.
      required: { level: { unit: 'inHg-vacuum', value: 0 } },
    })
    expect(await made<JobAnswer>(firm.technician.client, '/api/jobs', { id, ...said() })).toMatchObject({ id, number: first.number })
    expect(await refused(firm.technician, { id, ...said({ site: 'elsewhere' }) })).toBe(409)
    expect((await newJob()).number).toBe(first.number + 1)
  })

  it('is for who works with cylinders to make, and for everybody to read', async () => {
    for (const by of [firm.auditor, firm.admin]) expect(await refused(by, said())).toBe(403)
    for (const by of [firm.warehouse, firm.manager, trainee]) expect(await refused(by, said())).toBe(201)
    expect((await firm.admin.client.get('/api/jobs')).status).toBe(200)
    expect((await firm.auditor.client.get(`/api/jobs/${randomUUID()}`)).status).toBe(404)
  })

  it('is refused without a customer, for a firm of another sort, and for a refrigerant that nobody knows', async () => {
    const { customerId: _, ...without } = said()
    expect(await refused(firm.technician, without)).toBe(400)
    expect(await refused(firm.technician, said({ customerId: firm.reclaimer.id }))).toBe(422)
    expect(await refused(firm.technician, said({ refrigerant: 'R-9999' }))).toBe(422)
    expect(await refused(firm.technician, said({ keeps: 'nobody' }))).toBe(400)
    expect(await refused(firm.technician, said({ charge: lb(-1) }))).toBe(400)
  })

  it('whose refrigerant stays a customer\'s known by name makes that customer once; else the name is enough', async () => {
    const byName = (customerName: string, keeps: string) => newJob({ customerId: undefined, customerName, keeps })
    const first = await byName('Fenwick Ice', 'customer')
    expect(first.customer.id).not.toBeNull()
    expect((await byName('fenwick  ice', 'customer')).customer).toEqual(first.customer)
    expect((await byName('Larkhill Dairy', 'firm')).customer).toEqual({ id: null, name: 'Larkhill Dairy' })
    const { items } = (await firm.admin.client.get<FirmsAnswer>('/api/firms?kind=customer')).body
    expect(items.map(({ name }) => name)).toEqual(['Fenwick Ice', 'Ossory Foods'])
    expect(await refused(firm.technician, said({ customerId: undefined, customerName: 'Tarnvale Reclaim' }))).toBe(409)
  })

  it('is known to the log only once it was made', async () => {
    const cylinder = await registered(firm, { contents: 'evacuated' })
    const event = (jobId: string) => ({ ...eventOf(cylinder.id, 'filled'), details: { refrigerant: 'R-22', grossAfter: lb(30), jobId } })
    const answer = await firm.technician.client.post<EventsAnswer>('/api/events', { events: [event(randomUUID())] })
    expect(answer.body.results[0]).toMatchObject({ outcome: 'refused', problem: { status: 422, errors: [{ path: 'details.jobId', message: 'no such job' }] } })
    expect((await firm.technician.client.post<EventsAnswer>('/api/events', { events: [event((await newJob()).id)] })).body.results[0]).toMatchObject({ outcome: 'accepted' })
  })

  it('goes along in the phone\'s copy', async () => {
    const { id } = await newJob({ equipment: 'Walk-in box' })
    // The copy's list of the firm may be two seconds old.
    await expect.poll(async () => (await firm.technician.client.get<KitAnswer>('/api/kit')).body.firm?.jobs.find(job => job.id === id)?.equipment, { timeout: 5_000 }).toBe('Walk-in box')
  })
})

describe('what was recovered on a job', () => {
  it('is told by cylinder with its net, its vacuum, its owner and who did it, and what stands apart beside', async () => {
    const job = await newJob()
    const { cylinder } = await fill(job.id, 40, { reached: { vacuum: { inHg: 0.5 }, heldMinutes: 6 } })
    await fill(job.id, 32.5, {}, firm.technician, { practice: true })
    await fill(job.id, 30, {}, trainee, { supervisorId: firm.technician.id })
    const now = await jobNow(job.id)
    // 40.0 - 27.5 lb = 12.5 lb = 5669.9 g.
    expect(now).toMatchObject({ cylinders: 3, recoveredGrams: 5_670, notKnown: 0 })
    expect(now.fills.map(({ netGrams, apart }) => [netGrams, apart])).toEqual([[5_670, null], [2_268, 'practice'], [1_134, 'unsigned']])
    expect(now.fills[0]).toMatchObject({ cylinder: { id: cylinder.id }, ownerId: customerId, method: 'machine-liquid', reached: { verdict: 'reached', heldMinutes: 6 }, by: { name: 'Tina', certification: 'Type II, no. 4411' } })
    expect(now.cautions).toEqual([])
  })

  it('is listed by customer, by refrigerant, and as one\'s own', async () => {
    const mine = await made<JobAnswer>(firm.manager.client, '/api/jobs', said({ refrigerant: 'R-410A' }))
    const list = async (query: string, by = firm.manager) => (await by.client.get<JobsAnswer>(`/api/jobs?${query}`)).body.items.map(({ id }) => id)
    expect(await list('refrigerant=R-410A')).toEqual([mine.id])
    expect(await list(`customer=${customerId}`)).toContain(mine.id)
    expect(await list(`customer=${randomUUID()}`)).toEqual([])
    const before = await list('mine=true&limit=200')
    const theirs = await newJob()
    expect(await list('mine=true&limit=200')).toEqual(before)
    await fill(theirs.id, 30, {}, firm.manager)
    expect(await list('mine=true&limit=200')).toEqual([theirs.id, ...before])
    const [first] = (await firm.manager.client.get<JobsAnswer>('/api/jobs?limit=1')).body.items
    const { body } = await firm.manager.client.get<JobsAnswer>('/api/jobs?limit=1')
    expect(body.nextCursor).toBe(String(first!.number))
    expect((await firm.manager.client.get(`/api/jobs?cursor=x`)).status).toBe(400)
    expect((await firm.manager.client.get(`/api/jobs?whose=x`)).status).toBe(400)
  })
})

describe('the recovery note', () => {
  it('prints what the log says, counts its pages, and becomes a new issue once something was corrected', async () => {
    const job = await newJob()
    const { event, view } = await fill(job.id, 40)
    const { pages, name } = await noteText(job.id)
    expect(name).toBe(`inline; filename="recovery-note-${job.number}.pdf"`)
    pages.forEach((text, index) => expect(text).toContain(`Page ${index + 1} of ${pages.length}`))
    const text = pages.join('\n')
    for (const part of [`Recovery note ${job.number}`, 'Quillfen Cooling', 'Ossory Foods', '4 Quay Street', 'Chiller 2', '12.5 lb (5.67 kg)', 'machine, liquid', 'Tina: certification Type II, no. 4411', 'Vacuum reached', 'not known']) expect(text).toContain(part)
    expect(text).not.toContain('Issue 2')

    await posted(firm.technician.client, [{ ...eventOf(view.id, 'corrected'), details: { eventId: event.id, reason: 'read the wrong line', instead: { ...event.details, grossAfter: lb(37.5) } } }])
    const now = await jobNow(job.id)
    expect(now).toMatchObject({ issue: 2, recoveredGrams: 4_536, corrections: [{ reason: 'read the wrong line' }], fills: [{ corrected: true }] })
    const second = (await noteText(job.id)).pages.join('\n')
    for (const part of ['Issue 2', 'read the wrong line', '10.0 lb (4.54 kg)']) expect(second).toContain(part)
    expect(second).not.toContain('12.5 lb')

    const change = () => firm.technician.client.patch<JobAnswer>(`/api/jobs/${job.id}`, { site: '5 Quay Street' })
    expect((await change()).body).toMatchObject({ site: '5 Quay Street', issue: 3 })
    expect((await change()).body.issue).toBe(3)
    expect((await firm.technician.client.patch<JobAnswer>(`/api/jobs/${job.id}`, { email: 'office@ossory.example' })).body).toMatchObject({ email: 'office@ossory.example', issue: 3 })
    expect((await firm.auditor.client.patch(`/api/jobs/${job.id}`, { site: 'x' })).status).toBe(403)
  })

  it('goes to the customer\'s address as a PDF, once for each time it is asked for', async () => {
    const job = await newJob()
    await fill(job.id, 40)
    const path = `/api/jobs/${job.id}/recovery-note/mail`
    const id = randomUUID()
    const before = received.length
    const send = (body: object, by = firm.technician) => by.client.post<RecoveryNoteMailAnswer>(path, body)
    expect((await send({ id })).body).toEqual({ outcome: 'sent', recipient: 'plant@ossory.example', issue: 1 })
    expect((await send({ id })).body).toEqual({ outcome: 'sent', recipient: 'plant@ossory.example', issue: 1 })
    expect(received).toHaveLength(before + 1)
    const { to, text } = received.at(-1)!
    expect(to).toEqual(['plant@ossory.example'])
    expect(text).toContain(`recovery-note-${job.number}.pdf`)
    const [, encoded] = /Content-Type: application\/pdf[\s\S]*?\r?\n\r?\n([A-Za-z0-9+/=\r\n]+)/.exec(text) ?? []
    expect(pdfTexts(Buffer.from(encoded!.replace(/\s/g, ''), 'base64')).join('\n')).toContain(`Recovery note ${job.number}`)

    expect((await send({ id: randomUUID(), recipient: 'bounce@ossory.example' })).body).toMatchObject({ outcome: 'failed', recipient: 'bounce@ossory.example' })
    expect((await jobNow(job.id)).notes.map(({ recipient, issue, outcome }) => [recipient, issue, outcome])).toEqual([['bounce@ossory.example', 1, 'failed'], ['plant@ossory.example', 1, 'sent']])
    expect((await send({ id: randomUUID() }, firm.auditor)).status).toBe(403)
    expect((await send({ id: randomUUID(), recipient: 'nobody' })).status).toBe(400)
    const another = await newJob()
    expect((await firm.technician.client.post(`/api/jobs/${another.id}/recovery-note/mail`, { id })).status).toBe(409)
    const letters = async () => (await firm.admin.client.get<MailAnswer>('/api/mail')).body.items
    const invitation = (await letters()).find(({ recipient }) => recipient === firm.auditor.email)!
    expect((await send({ id: invitation.id })).status).toBe(409)
    expect((await letters()).find(letter => letter.id === invitation.id)!.attachments).toEqual([])
    const nameOnly = await newJob({ customerId: undefined, customerName: 'Larkhill Dairy', keeps: 'firm' })
    expect((await firm.technician.client.post<ProblemDetails>(`/api/jobs/${nameOnly.id}/recovery-note/mail`, { id: randomUUID() })).body).toMatchObject({ status: 422, errors: [{ path: 'recipient' }] })
  })
})

describe('refrigerant banked in a customer\'s name', () => {
  it('stays theirs until it leaves, and what was credited for it is theirs by their share', async () => {
    const { id } = await made<{ id: string }>(firm.admin.client, '/api/firms', { name: 'Brandane Hotel', kind: 'customer' })
    const bankedNow = async (by = firm.manager) => (await by.client.get<BankedAnswer>(`/api/firms/${id}/banked`)).body
    expect(await bankedNow()).toEqual({ held: [], movements: [], movementsInAll: 0, shipped: [] })
    const job = await newJob({ customerId: id })
    const { cylinder, view } = await fill(job.id, 40, { ownerOfRefrigerantId: id })
    expect(await bankedNow()).toMatchObject({
      held: [{ refrigerant: 'R-22', condition: 'clean', grams: 5_670, notKnown: 0, cylinders: [{ id: cylinder.id, grams: 5_670, isShared: false }] }],
      movements: [{ cause: 'recovered', refrigerant: 'R-22', grams: 5_670, kind: 'filled', apart: false }], movementsInAll: 1, shipped: [],
    })
    expect((await firm.technician.client.get(`/api/firms/${id}/banked`)).status).toBe(403)
    expect((await firm.manager.client.get(`/api/firms/${firm.reclaimer.id}/banked`)).status).toBe(409)
    expect((await firm.manager.client.get(`/api/firms/${randomUUID()}/banked`)).status).toBe(404)

    const shipment = await made<{ id: string }>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [cylinder.id] })
    await readied(firm.warehouse.client, shipment.id, [{ cylinderId: cylinder.id, gross: lb(40) }])
    const left = await firm.manager.client.post(`/api/shipments/${shipment.id}/dispatch`, {
      occurredAt: new Date().toISOString(), lines: [{ cylinderId: cylinder.id, eventId: randomUUID(), expects: view.version, gross: lb(40) }],
    })
    expect(left.status).toBe(200)
    expect(await bankedNow()).toMatchObject({ held: [], shipped: [{ shipment: { id: shipment.id }, to: { name: 'Tarnvale Reclaim' }, grams: 5_670, wholeGrams: 5_670, creditCents: null }] })
  })
})
