import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DockEntriesAnswer, NewDockLinkAnswer } from '../../utils/contract/dock'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { CsvPreviewAnswer, MixingCostAnswer, SettlementAnswer } from '../../utils/contract/settlement'
import type { ShipmentFilesAnswer } from '../../utils/contract/shipmentFiles'
import type { ShipmentWithLines } from '../../utils/contract/shipments'
import type { CustodyLogAnswer } from '../../utils/contract/custody'
import type { MassReading } from '../../utils/quantity/mass'
import { NOTHING_SAID, type LineFigures } from '../../utils/settlement/figures'
import type { ShipmentActsAnswer } from '../../utils/shipment/acts'
import { TestClient, type Answer } from '../helpers/client'
import { cylinderNow, eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { redAndBlue, redAndBlueJpeg } from '../helpers/pictures'
import { readied } from '../helpers/readyShipment'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let firm: Shop
const YEAR = new Date().getFullYear()

beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  await made(firm.manager.client, `/api/firms/${firm.reclaimer.id}/terms`, {
    id: randomUUID(), fromDay: `${YEAR - 1}-01-01`,
    terms: {
      refrigerants: ['R-22', 'R-410A'].map(designation => ({ designation, conditions: ['clean'] })), takesMixed: true, takesUnknown: false, takesOverdue: false,
      specs: null, pressuresPsig: null, mostContaminationPercent: null, minimum: null, minimumCylinders: null, pickUpCents: null, note: null,
    },
  })
  const price = (refrigerant: string | null, condition: string, mills: number) =>
    made(firm.manager.client, `/api/firms/${firm.reclaimer.id}/prices`, { id: randomUUID(), refrigerant, condition, fromDay: `${YEAR - 1}-01-01`, untilDay: null, mills, per: 'lb' })
  await price('R-22', 'clean', 2_400)
  await price('R-410A', 'clean', 1_000)
  await price(null, 'mixed', -1_500)
})
afterAll(() => server.stop())

const act = () => ({ id: randomUUID(), occurredAt: new Date().toISOString() })
const path = (id: string) => `/api/shipments/${id}`

interface Sent { id: string, cylinderIds: string[] }

/** A shipment that has left with so many cylinders at 40 lb gross, 12.5 lb net each, of R-22 or of that mixed with another. */
async function sentOff(count: number, mixedWith?: string): Promise<Sent> {
  const cylinders = []
  for (let made = 0; made < count; made++) cylinders.push(await registered(firm))
  const cylinderIds = cylinders.map(cylinder => cylinder.id)
  if (mixedWith !== undefined) {
    await posted(firm.technician.client, cylinderIds.map(cylinderId => ({ ...eventOf(cylinderId, 'filled'), details: { refrigerant: mixedWith, grossBefore: lb(40), grossAfter: lb(41) } })))
  }
  const { id } = await made<ShipmentWithLines>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds })
  if (mixedWith !== undefined) {
    const classification = { identification: 'UN1078', technicalNames: ['chlorodifluoromethane', 'difluoromethane'], reason: 'as analysed' }
    for (const cylinderId of cylinderIds) expect((await firm.warehouse.client.put(`${path(id)}/lines/${cylinderId}/classification`, { ...act(), classification })).status).toBe(200)
  }
  const { lines } = await readied(firm.warehouse.client, id, cylinderIds.map(cylinderId => ({ cylinderId, gross: lb(40) })))
  const { status, body } = await firm.manager.client.post<ShipmentWithLines & ProblemDetails>(`${path(id)}/dispatch`, {
    occurredAt: new Date().toISOString(), lines: lines.map(line => ({ cylinderId: line.cylinder.id, eventId: randomUUID(), expects: line.version, gross: lb(40) })),
  })
  if (status !== 200) throw new Error(JSON.stringify(body))
  return { id, cylinderIds }
}

async function shown(id: string): Promise<SettlementAnswer> {
  const { status, body } = await firm.auditor.client.get<SettlementAnswer>(`${path(id)}/settlement`)
  expect(status).toBe(200)
  return body
}

const TAKEN = (net: MassReading, more: Partial<LineFigures> = {}): LineFigures =>
  ({ ...NOTHING_SAID, theirGross: lb(40), acceptedNet: net, grade: 'A', rate: { mills: 2_400, per: 'lb' }, outcome: 'taken-over', ...more })

/** Enters figures of lines as a manager who has just looked. */
async function entered(id: string, lines: Record<string, LineFigures>): Promise<Answer<SettlementAnswer & ProblemDetails>> {
  const { revision } = await shown(id)
  return firm.manager.client.put(`${path(id)}/settlement/lines`, { ...act(), revision, lines: Object.entries(lines).map(([cylinderId, figures]) => ({ cylinderId, ...figures })) })
}

function settling({ revision, lines }: SettlementAnswer, ids: string[]) {
  const versions = new Map(lines.map(line => [line.cylinder.id, line.version]))
  return { ...act(), revision, lines: ids.map(cylinderId => ({ cylinderId, eventId: randomUUID(), expects: versions.get(cylinderId)! })) }
}

async function settled(id: string, ids: string[]): Promise<Answer<SettlementAnswer & ProblemDetails>> {
  return firm.manager.client.post(`${path(id)}/settlement/settle`, settling(await shown(id), ids))
}

async function form<T>(to: string, fields: Record<string, string>, file: Uint8Array | string, by = firm.manager): Promise<Answer<T>> {
  const data = new FormData()
  for (const [name, value] of Object.entries(fields)) data.append(name, value)
  data.append('file', new Blob([typeof file === 'string' ? file : new Uint8Array(file)]), 'whatever.exe')
  const body = new Response(data)
  return by.client.sendBytes<T>(to, Buffer.from(await body.arrayBuffer()), { 'content-type': body.headers.get('content-type')! })
}

async function serials(id: string): Promise<string[]> {
  return (await shown(id)).lines.map(line => line.cylinder.serial!)
}

describe('the figures of a settlement', () => {
  it('begin with the price of the day, are each an act of the shipment, and stand beside ours', async () => {
    const { id, cylinderIds: [first, second] } = await sentOff(2)
    const before = await shown(id)
    expect(before).toMatchObject({ missing: { outcome: [first, second] }, credit: { totalCents: null, unknownLines: 2 } })
    expect(before.lines[0]).toMatchObject({ isEntered: false, figures: { ...NOTHING_SAID, rate: { mills: 2_400, per: 'lb' } }, weights: { ourGrossGrams: 18_144, ourNetGrams: 5_670, acceptedNetGrams: null, net: null } })

    const { status, body } = await entered(id, { [first!]: TAKEN(lb(12.4)), [second!]: TAKEN(lb(12.5)) })
    expect(status).toBe(200)
    // 12.4 x 2.40 = 29.76; 12.5 x 2.40 = 30.00.
    expect(body.credit).toMatchObject({ totalCents: 5_976, lines: [{ cents: 2_976 }, { cents: 3_000 }] })
    expect(body.disputes).toEqual([])
    const { items } = (await firm.auditor.client.get<ShipmentActsAnswer>(`${path(id)}/acts`)).body
    expect(items.at(-1)).toMatchObject({ kind: 'figures-set', by: 'Mona', details: { changes: expect.arrayContaining([{ cylinderId: first, field: 'acceptedNet', from: null, to: lb(12.4) }]) } })
  })

  it('are not written over what somebody else has entered meanwhile, and the same request twice is one', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    const { revision } = await shown(id)
    const body = { ...act(), revision, lines: [{ cylinderId: first, ...TAKEN(lb(12.5)) }] }
    const put = (body: object) => firm.manager.client.put<SettlementAnswer & ProblemDetails>(`${path(id)}/settlement/lines`, body)
    const [one, other] = await Promise.all([put(body), put({ ...body, id: randomUUID() })])
    expect([one.status, other.status].sort()).toEqual([200, 409])
    const repeated = await put(one.status === 200 ? body : { ...body, id: body.id })
    expect(one.status === 200 ? repeated.status : 409).toBe(one.status === 200 ? 200 : 409)
    const kept = (await firm.auditor.client.get<ShipmentActsAnswer>(`${path(id)}/acts`)).body.items.filter(item => item.kind === 'figures-set')
    expect(kept).toHaveLength(1)
  })

  it('are read by whoever may see shipments, entered only by a manager, and not before it has left', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    const body = { ...act(), revision: 0, lines: [{ cylinderId: first, ...NOTHING_SAID }] }
    expect((await firm.technician.client.get(`${path(id)}/settlement`)).status).toBe(403)
    for (const member of [firm.warehouse, firm.auditor, firm.technician]) expect((await member.client.put(`${path(id)}/settlement/lines`, body)).status).toBe(403)
    const draft = await made<ShipmentWithLines>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [] })
    expect((await firm.manager.client.get(`${path(draft.id)}/settlement`)).status).toBe(409)
    expect((await entered(id, { [randomUUID()]: NOTHING_SAID })).status).toBe(422)
  })

  it('hold the statement against its own lines, to the cent', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    await entered(id, { [first!]: TAKEN(lb(12.5), { statedCents: 3_000 }) })
    const say = async (totalCents: number) => {
      const { revision } = await shown(id)
      const { body } = await firm.manager.client.put<SettlementAnswer>(`${path(id)}/settlement/statement`, { ...act(), revision, number: 'ST-71', day: '2026-03-02', others: [{ what: 'Pick-up', cents: -500 }], totalCents })
      return body
    }
    expect((await say(2_501)).disputes).toMatchObject([{ about: 'total', cylinderId: null, isByFigures: true, isOpen: true }])
    const mended = await say(2_500)
    expect(mended.credit).toMatchObject({ totalCents: 2_500, differenceCents: 0 })
    expect(mended.disputes).toMatchObject([{ isOpen: false, outcome: 'no-difference' }])
    expect(mended.missing.statement).toEqual([])
  })
})

describe('a dispute', () => {
  it('opens by a difference beyond both scales, is talked over with photos, ends with an outcome, and opens again by other figures', async () => {
    const { id, cylinderIds: [first, second] } = await sentOff(2)
    // Both scales at 40 lb: twice 91 g = 0.40 lb. 12.5 - 12.1 = 0.4 lb = 181.4 g is within, 12.0 lb is not.
    const { body: open } = await entered(id, { [first!]: TAKEN(lb(12)), [second!]: TAKEN(lb(12.1)) })
    expect(open.disputes).toMatchObject([{ about: 'net', cylinderId: first, isByFigures: true, isOpen: true }])
    const dispute = `${path(id)}/disputes/${open.disputes[0]!.id}`

    const photoId = randomUUID()
    expect((await form('/api/uploads', { id: photoId, subject: 'scale' }, redAndBlue())).status).toBe(200)
    expect((await form('/api/uploads', { id: randomUUID(), subject: 'scale' }, redAndBlue(), firm.technician)).status).toBe(200)
    const message = { ...act(), text: 'Our scale was checked that morning.', photoIds: [photoId] }
    for (const time of [1, 2]) expect((await firm.manager.client.post(`${dispute}/messages`, message)).status, `sending ${time}`).toBe(200)
    expect((await firm.manager.client.post(`${dispute}/messages`, { ...message, id: randomUUID(), photoIds: [randomUUID()] })).status).toBe(422)
    expect((await firm.warehouse.client.post(`${dispute}/messages`, { ...message, id: randomUUID() })).status).toBe(403)

    const end = { ...act(), outcome: 'theirs-accepted', reason: 'They weighed it again before us.' }
    const ended = await firm.manager.client.post<SettlementAnswer>(`${dispute}/end`, end)
    expect(ended.body.disputes[0]).toMatchObject({ isOpen: false, outcome: 'theirs-accepted' })
    expect(ended.body.disputes[0]!.history.map(entry => [entry.kind, entry.by, entry.photoIds.length])).toEqual([['opened', null, 0], ['message', 'Mona', 1], ['ended', 'Mona', 0]])
    expect((await firm.manager.client.post(`${dispute}/end`, end)).status).toBe(200)
    expect((await firm.manager.client.post(`${dispute}/end`, { ...end, id: randomUUID() })).status).toBe(409)
    expect((await firm.manager.client.post(`${dispute}/messages`, { ...message, id: randomUUID() })).status).toBe(409)

    expect((await entered(id, { [first!]: TAKEN(lb(12), { grade: 'B' }) })).body.disputes[0]!.isOpen).toBe(false)
    const again = await entered(id, { [first!]: TAKEN(lb(11.9)) })
    expect(again.body.disputes).toMatchObject([{ isOpen: true, outcome: null }])
    expect(again.body.disputes[0]!.history.at(-1)).toMatchObject({ kind: 'reopened', by: null })
    // Under another shipment it is not known.
    const { id: other } = await sentOff(1)
    expect((await firm.manager.client.post(`${path(other)}/disputes/${open.disputes[0]!.id}/messages`, { ...message, id: randomUUID() })).status).toBe(404)
  })

  it('is opened by a person about what no figure shows, once', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    const body = { ...act(), disputeId: randomUUID(), about: 'grade', cylinderId: first, text: 'It was clean when it left.' }
    const opened = await firm.manager.client.post<SettlementAnswer>(`${path(id)}/disputes`, body)
    expect(opened.body.disputes).toMatchObject([{ about: 'grade', isByFigures: false, isOpen: true, history: [{ text: body.text, by: 'Mona' }] }])
    expect((await firm.manager.client.post(`${path(id)}/disputes`, body)).status).toBe(200)
    expect((await firm.manager.client.post(`${path(id)}/disputes`, { ...body, ...act(), disputeId: randomUUID() })).status).toBe(409)
    expect((await entered(id, { [first!]: TAKEN(lb(12.5)) })).body.disputes).toMatchObject([{ isOpen: true }])
  })
})

describe('settling', () => {
  it('waits until all is said, puts each line into its log in one commit, and closes only without an open dispute', async () => {
    const { id, cylinderIds: [taken, back, gone] } = await sentOff(3)
    await entered(id, { [taken!]: TAKEN(lb(11), { rate: { mills: -1_255, per: 'lb' } }) })
    expect(await settled(id, [taken!])).toMatchObject({ status: 409, body: { title: 'Not everything is said' } })
    await entered(id, { [back!]: { ...NOTHING_SAID, outcome: 'sent-back' }, [gone!]: { ...NOTHING_SAID, outcome: 'not-arrived' } })
    expect((await settled(id, [])).status).toBe(409)
    expect((await settled(id, [taken!, back!])).status).toBe(409)

    const body = settling(await shown(id), [taken!, gone!])
    const settle = (body: object) => firm.manager.client.post<SettlementAnswer & ProblemDetails>(`${path(id)}/settlement/settle`, body)
    expect((await firm.warehouse.client.post(`${path(id)}/settlement/settle`, body)).status).toBe(403)
    expect((await settle({ ...body, revision: body.revision - 1 })).body.type).toBe('figures-changed')
    expect((await settle({ ...body, lines: body.lines.map(line => ({ ...line, expects: line.expects - 1 })) })).status).toBe(409)
    expect((await shown(id)).shipment.state).toBe('dispatched')

    const done = await settle(body)
    expect(done.status).toBe(200)
    expect(done.body.shipment).toMatchObject({ state: 'settled', settledAt: expect.any(String) })
    expect((await settle(body)).body.shipment).toEqual(done.body.shipment)
    expect((await settle({ ...body, ...act() })).status).toBe(409)
    expect((await cylinderNow(firm.auditor.client, taken!)).contents).toMatchObject({ nothingInIt: true, netGrams: 0 })
    expect((await cylinderNow(firm.auditor.client, gone!)).lifecycle).toBe('missing')
    expect((await cylinderNow(firm.auditor.client, back!)).lifecycle).toBe('at-reclaim')
    const log = (await firm.auditor.client.get<CustodyLogAnswer>(`/api/cylinders/${taken}/events`)).body
    expect(log.items.find(line => line.kind === 'reclaimed')!.details).toEqual({ shipmentId: id, theirGross: lb(40), acceptedNet: lb(11), grade: 'A', price: -1.255, pricePer: 'lb' })
    // What a reclaimer paid is not for who works in the field.
    for (const which of ['events', 'fold']) {
      const { status, body } = await firm.technician.client.get(`/api/cylinders/${taken}/${which}`)
      expect([status, JSON.stringify(body).includes('"acceptedNet"'), /"price(Per)?"/.test(JSON.stringify(body))]).toEqual([200, true, false])
    }

    // 12.5 - 11 lb is beyond both scales, and one did not arrive.
    expect(done.body.disputes.map(dispute => [dispute.about, dispute.isOpen])).toEqual(expect.arrayContaining([['net', true], ['missing', true]]))
    const close = act()
    const closing = () => firm.manager.client.post<SettlementAnswer & ProblemDetails>(`${path(id)}/settlement/close`, close)
    expect((await closing()).body.type).toBe('dispute-open')
    for (const dispute of done.body.disputes) {
      await firm.manager.client.post(`${path(id)}/disputes/${dispute.id}/end`, { ...act(), outcome: 'agreed', reason: 'Spoken about.' })
    }
    expect((await closing()).body.shipment).toMatchObject({ state: 'closed', closedAt: expect.any(String) })
    expect((await closing()).status).toBe(200)
    expect((await entered(id, { [taken!]: TAKEN(lb(12)) })).status).toBe(409)
    const free = await made<ShipmentWithLines>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [taken!] })
    expect(free.lines).toHaveLength(1)
  })

  it('corrects the log where a settled line’s figures are others afterwards, and nothing where they are not', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    await entered(id, { [first!]: TAKEN(lb(12)) })
    await settled(id, [first!])
    const before = (await cylinderNow(firm.auditor.client, first!)).version
    expect((await entered(id, { [first!]: TAKEN(lb(12), { statedCents: 2_880 }) })).status).toBe(200)
    expect((await cylinderNow(firm.auditor.client, first!)).version).toBe(before)
    expect((await entered(id, { [first!]: TAKEN(lb(12.3)) })).status).toBe(200)
    const { body } = await firm.auditor.client.get<ShipmentWithLines>(path(id))
    // 12.3 lb = 5579.2 g.
    expect(body.lines[0]!.received).toMatchObject({ acceptedNetGrams: 5_579 })
    expect((await cylinderNow(firm.auditor.client, first!)).version).toBe(before + 1)
    expect(JSON.stringify((await firm.technician.client.get(`/api/cylinders/${first}/events`)).body)).not.toMatch(/"price(Per)?"/)
    expect((await entered(id, { [first!]: { ...TAKEN(lb(12.3)), outcome: 'sent-back' } })).status).toBe(409)
  })

  it('is refused where the dock said something else since it was looked at, and takes the figures that were', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    const link = await made<NewDockLinkAnswer>(firm.manager.client, `${path(id)}/dock-links`, { id: randomUUID(), forWhom: 'Dock 2' })
    const graded = async (value: number) => {
      const entry = { id: randomUUID(), kind: 'graded', name: 'Dana', at: new Date().toISOString(), said: { cylinderId: first, grade: 'A', acceptedNet: lb(value) } }
      const { body } = await new TestClient(server.baseUrl).post<DockEntriesAnswer>(`/api/dock/${new URL(link.url).pathname.slice('/d/'.length)}/shipments/${id}/entries`, { deviceNow: entry.at, entries: [entry] })
      expect(body.results[0]!.outcome).toBe('accepted')
    }
    await graded(12.5)
    const looked = await shown(id)
    await graded(2)
    const settle = (seen: SettlementAnswer) => firm.manager.client.post<SettlementAnswer & ProblemDetails>(`${path(id)}/settlement/settle`, settling(seen, [first!]))
    expect(await settle(looked)).toMatchObject({ status: 409, body: { type: 'figures-changed' } })
    // What the dock says takes nothing away from what is entered by hand.
    const byHand = { ...act(), revision: looked.revision, lines: [{ cylinderId: first, ...TAKEN(lb(12.4)) }] }
    expect((await firm.manager.client.put(`${path(id)}/settlement/lines`, byHand)).status).toBe(200)
    expect(await settle(await shown(id))).toMatchObject({ status: 200, body: { lines: [{ figures: { acceptedNet: lb(12.4) } }] } })
  })

  it('settles what came back before as sent back, whatever was entered', async () => {
    const { id, cylinderIds: [first, second] } = await sentOff(2)
    await entered(id, { [first!]: TAKEN(lb(12.5)), [second!]: TAKEN(lb(12.5)) })
    const returned = await firm.manager.client.post(`${path(id)}/returns`, {
      occurredAt: new Date().toISOString(), placeId: firm.shop.id, reason: 'Refused at the dock', lines: [{ cylinderId: second, eventId: randomUUID(), gross: lb(40) }],
    })
    expect(returned.status).toBe(200)
    expect((await shown(id)).lines[1]!.figures.outcome).toBe('sent-back')
    expect((await settled(id, [first!, second!])).status).toBe(409)
    expect((await settled(id, [first!])).status).toBe(200)
    expect((await cylinderNow(firm.auditor.client, second!)).contents.netGrams).toBe(5_670)
  })
})

describe('a statement as a file', () => {
  const read = <T = CsvPreviewAnswer & ProblemDetails>(id: string, file: Uint8Array | string, fields: Record<string, string> = {}) => form<T>(`${path(id)}/settlement/csv-preview`, fields, file)
  const takenOver = (id: string, file: string, fields: Record<string, string>) => form<SettlementAnswer & ProblemDetails>(`${path(id)}/settlement/csv-take-over`, fields, file)

  it('is looked at row by row before anything of it is taken over, and taken over as it was looked at', async () => {
    const { id, cylinderIds } = await sentOff(2)
    const [first, second] = await serials(id)
    const file = `\uFEFFserial;gross;net;unit;price;credit\r\n${first};40,0;12,4;lb;2,40;29,76\r\n${second};vierzig;12;lb;2,4;\r\nNOBODY;1;1;lb;;\r\n`
    const { status, body: preview } = await read(id, file, { decimal: 'comma' })
    expect(status).toBe(200)
    expect(preview).toMatchObject({ delimiter: 'semicolon', notNamed: [] })
    expect(preview.rows.map(row => [row.row, row.cylinderId, row.problems.map(problem => problem.column)])).toEqual([[2, cylinderIds[0], []], [3, cylinderIds[1], ['gross']], [4, null, ['serial']]])
    expect((await shown(id)).lines[0]!.isEntered).toBe(false)

    const take = { ...act(), decimal: 'comma', previewHash: preview.hash }
    expect((await takenOver(id, file.replace('12,4', '12,3'), take)).body.type).toBe('preview-changed')
    expect((await takenOver(id, file, { ...take, previewHash: '0'.repeat(64) })).status).toBe(409)
    const done = await takenOver(id, file, take)
    expect(done.status).toBe(200)
    expect(done.body.lines[0]!.figures).toEqual({ theirGross: lb(40), acceptedNet: lb(12.4), grade: null, rate: { mills: 2_400, per: 'lb' }, statedCents: 2_976, outcome: 'taken-over' })
    expect(done.body.lines[1]!.isEntered).toBe(false)
    expect((await takenOver(id, file, take)).status).toBe(200)
    expect((await firm.auditor.client.get<ShipmentActsAnswer>(`${path(id)}/acts`)).body.items.at(-1)).toMatchObject({ kind: 'statement-taken', details: { rows: 3, taken: 1, wrong: 2 } })
  })

  it('is not taken over where figures changed since it was looked at', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    const file = `serial,net,unit\n${(await serials(id))[0]},12.4,lb\n`
    const { body: preview } = await read(id, file)
    await entered(id, { [first!]: TAKEN(lb(12.5)) })
    expect(await takenOver(id, file, { ...act(), previewHash: preview.hash })).toMatchObject({ status: 409, body: { type: 'preview-changed' } })
    expect((await shown(id)).lines[0]!.figures.acceptedNet).toEqual(lb(12.5))
  })

  it('takes other names of columns by choice, and an older encoding by choice', async () => {
    const { id } = await sentOff(1)
    const [serial] = await serials(id)
    const file = `Zyl.-Nr.,Gewicht,Güte\n${serial},5.6,prüf\n`
    const unread = await read(id, file)
    expect(unread.body).toMatchObject({ rows: [], header: { notOurs: ['Zyl.-Nr.', 'Gewicht', 'Güte'], problems: [expect.any(String)] } })
    const columns = JSON.stringify({ serial: 'Zyl.-Nr.', net: 'Gewicht', grade: 'Güte' })
    expect((await read(id, file, { columns, unit: 'kg' })).body.rows[0]).toMatchObject({ problems: [], changes: expect.arrayContaining([{ field: 'grade', from: null, to: 'prüf' }]) })
    const old = Buffer.from(file, 'latin1')
    expect(await read(id, old, { columns, unit: 'kg' })).toMatchObject({ status: 422, body: { type: 'not-utf-8' } })
    expect((await read(id, old, { columns, unit: 'kg', encoding: 'windows-1252' })).body.rows[0]!.problems).toEqual([])
    expect((await read(id, file, { columns: '{"nothing":"x"}' })).status).toBe(400)
  })

  it('is refused where it is no table, another encoding, or too large', async () => {
    const { id } = await sentOff(1)
    expect((await read(id, Buffer.from('\uFEFFserial,net\nA,1\n', 'utf16le'))).body.type).toBe('other-encoding')
    expect((await read(id, 'serial,net\n"A,1\n')).body.type).toBe('not-a-table')
    expect((await read(id, 'serial,net,grade\nA,1,6" dia.\n')).body).toMatchObject({ status: 422, type: 'not-a-table', detail: expect.stringContaining('line 2') })
    expect((await read(id, `serial,net\n${'A,1\n'.repeat(1_001)}`)).body.type).toBe('too-many-rows')
    expect((await read(id, 'x'.repeat(512 * 1024 + 1))).status).toBe(400)
    expect((await read(id, 'x'.repeat(600 * 1024))).status).toBe(413)
    expect((await form(`${path(id)}/settlement/csv-preview`, {}, 'serial,net\n', firm.warehouse)).status).toBe(403)
  })

  it('comes empty, with the serials in it, and the settlement as a table of values', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    const [serial] = await serials(id)
    const get = async (query: string) => (await firm.auditor.client.get<string>(`${path(id)}/settlement/csv${query}`)).body
    expect(await get('?empty=yes')).toBe(`serial,gross,net,unit,grade,price,per,credit\r\n${serial},,,lb,,,lb,\r\n`)
    await entered(id, { [first!]: TAKEN(lb(12)) })
    expect((await get('?unit=lb')).split('\r\n')[1]).toMatch(new RegExp(`^${serial},[^,]+,R-22,clean,taken-over,lb,40,12.5,40,12,0,-0.5,yes,A,2.4,lb,28.8,$`))
  })
})

describe('a file of a shipment', () => {
  const add = (id: string, file: Uint8Array | string, fields: Record<string, string> = {}, by = firm.manager) =>
    form<ShipmentFilesAnswer & ProblemDetails>(`${path(id)}/files`, { id: randomUUID(), kind: 'statement', name: 'St 71.pdf', ...fields }, file, by)
  const PDF = '%PDF-1.7\n%nothing more\n'

  it('is served to whoever may see shipments, to be saved and never shown, and to nobody else', async () => {
    const { id } = await sentOff(1)
    const { status, body } = await add(id, PDF, { name: '..\\a"b/St 71 ü.exe' })
    expect(status).toBe(200)
    expect(body.items).toMatchObject([{ kind: 'statement', name: 'St 71 ü.pdf', mediaType: 'application/pdf', bytes: PDF.length, by: 'Mona', cylinderIds: [] }])
    const at = `${path(id)}/files/${body.items[0]!.id}`
    const got = await firm.auditor.client.get<string>(at)
    expect(got.body).toBe(PDF)
    expect(got.headers.get('content-disposition')).toBe('attachment; filename="St 71 _.pdf"; filename*=UTF-8\'\'St%2071%20%C3%BC.pdf')
    expect([got.headers.get('x-content-type-options'), got.headers.get('content-security-policy')]).toEqual(['nosniff', 'default-src \'none\'; sandbox'])
    expect((await firm.technician.client.get(at)).status).toBe(403)
    const { id: other } = await sentOff(1)
    expect((await firm.manager.client.get(`${path(other)}/files/${body.items[0]!.id}`)).status).toBe(404)
  })

  it('is told by its content: a picture is drawn anew, and nothing else is taken', async () => {
    const { id } = await sentOff(1)
    const picture = await redAndBlueJpeg()
    const { body } = await add(id, picture, { name: 'x.pdf', kind: 'certificate' })
    expect(body.items[0]).toMatchObject({ name: 'x.jpg', mediaType: 'image/jpeg' })
    expect((await add(id, 'serial,net\nA,1\n')).body.items[1]).toMatchObject({ mediaType: 'text/csv' })
    for (const file of ['<html>,</html>', 'MZ\u0000\u0001,', 'plain words']) expect((await add(id, file)).status, file).toBe(415)
    expect((await add(id, picture.subarray(0, picture.length / 2))).status).toBe(422)
    expect((await add(id, `%PDF-${'x'.repeat(10 * 1024 * 1024)}`)).status).toBe(400)
    expect((await add(id, `%PDF-${'x'.repeat(11 * 1024 * 1024)}`)).status).toBe(413)
    expect((await add(id, PDF, {}, firm.warehouse)).status).toBe(403)
  })

  it('is tied to lines and withdrawn, each as an act, and once however often it is sent', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1)
    const fileId = randomUUID()
    for (const time of [1, 2]) expect((await add(id, PDF, { id: fileId, cylinderIds: first! })).body.items, `sending ${time}`).toMatchObject([{ cylinderIds: [first] }])
    expect((await add(id, PDF, { cylinderIds: randomUUID() })).status).toBe(422)
    const tied = await firm.manager.client.put<ShipmentFilesAnswer>(`${path(id)}/files/${fileId}/lines`, { ...act(), cylinderIds: [] })
    expect(tied.body.items[0]!.cylinderIds).toEqual([])
    const withdrawal = act()
    for (const time of [1, 2]) expect((await firm.manager.client.post<ShipmentFilesAnswer>(`${path(id)}/files/${fileId}/withdraw`, withdrawal)).body.items, `sending ${time}`).toEqual([])
    expect((await firm.manager.client.get(`${path(id)}/files/${fileId}`)).status).toBe(404)
    const kinds = (await firm.auditor.client.get<ShipmentActsAnswer>(`${path(id)}/acts`)).body.items.map(item => item.kind)
    expect(kinds.slice(-3)).toEqual(['file-added', 'file-tied', 'file-withdrawn'])
  })
})

describe('what mixing cost', () => {
  it('is what the best of it would have been credited clean, and the charge besides', async () => {
    const { id, cylinderIds: [first] } = await sentOff(1, 'R-410A')
    expect((await shown(id)).lines[0]).toMatchObject({ sent: { condition: 'mixed', refrigerant: null }, figures: { rate: { mills: -1_500, per: 'lb' } } })
    await entered(id, { [first!]: TAKEN(lb(10), { rate: { mills: -1_500, per: 'lb' } }) })
    await settled(id, [first!])
    const { body } = await firm.manager.client.get<MixingCostAnswer>(`/api/reclaim/mixing-cost?year=${YEAR}`)
    // 10 lb of R-22 clean: 24.00; charged 15.00.
    expect(body).toMatchObject({ costCents: 3_900, unknownLines: 0, lines: [{ cylinderId: first, creditedCents: -1_500, best: { refrigerant: 'R-22', cents: 2_400 } }] })
    expect((await firm.manager.client.get<MixingCostAnswer>(`/api/reclaim/mixing-cost?year=${YEAR - 1}`)).body.lines).toEqual([])
    expect((await firm.technician.client.get(`/api/reclaim/mixing-cost?year=${YEAR}`)).status).toBe(403)
  })
})
