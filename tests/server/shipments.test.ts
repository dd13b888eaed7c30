import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CustodyLogAnswer, FleetAnswer, OpenListAnswer } from '../../utils/contract/custody'
import type { Firm } from '../../utils/contract/places'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { ShipmentsAnswer, ShipmentWithLines } from '../../utils/contract/shipments'
import type { CylinderView } from '../../utils/custody/cylinderView'
import type { MassReading } from '../../utils/quantity/mass'
import type { ShipmentActsAnswer } from '../../utils/shipment/acts'
import { cylinderNow, eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { readied } from '../helpers/readyShipment'
import { startServer, type TestServer } from '../helpers/server'
import { settledWith } from '../helpers/settledShipment'
import { lb } from '../helpers/stamps'

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

function draft(cylinders: CylinderView[], more: object = {}): Promise<ShipmentWithLines> {
  return made(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: cylinders.map(one => one.id), ...more })
}

const act = () => ({ id: randomUUID(), occurredAt: new Date().toISOString() })

/** Scans and weighs these cylinders of a shipment and makes it ready. */
function ready(id: string, cylinders: CylinderView[], gross: MassReading = lb(40)): Promise<ShipmentWithLines> {
  return readied(firm.warehouse.client, id, cylinders.map(one => ({ cylinderId: one.id, gross })))
}

/** A shipment that may leave with these cylinders. */
async function readyWith(cylinders: CylinderView[], gross?: MassReading): Promise<ShipmentWithLines> {
  return ready((await draft(cylinders)).id, cylinders, gross)
}

/** A dispatch of these cylinders at the weights they were registered with. */
function weighedOut(cylinders: CylinderView[], gross: MassReading = lb(40)) {
  return {
    occurredAt: new Date().toISOString(),
    lines: cylinders.map(one => ({ cylinderId: one.id, eventId: randomUUID(), expects: one.version, gross })),
  }
}

function dispatched(id: string, body: object, by = firm.manager) {
  return by.client.post<ShipmentWithLines & ProblemDetails>(`/api/shipments/${id}/dispatch`, body)
}

function changed(id: string, change: { add?: string[], takeOff?: string[] }, reason = 'Not found') {
  return firm.warehouse.client.patch<ShipmentWithLines & ProblemDetails>(`/api/shipments/${id}/lines`, {
    occurredAt: new Date().toISOString(),
    add: (change.add ?? []).map(cylinderId => ({ id: randomUUID(), cylinderId })),
    takeOff: (change.takeOff ?? []).map(cylinderId => ({ id: randomUUID(), cylinderId, reason })),
  })
}

async function shown(id: string): Promise<ShipmentWithLines> {
  return (await firm.auditor.client.get<ShipmentWithLines>(`/api/shipments/${id}`)).body
}

async function actsOf(id: string): Promise<string[]> {
  return (await firm.auditor.client.get<ShipmentActsAnswer>(`/api/shipments/${id}/acts`)).body.items.map(one => `${one.kind} by ${one.by}`)
}

describe('a shipment to a reclaimer', () => {
  it('leaves with the weight of each line, is received with the reclaimer\'s, and frees its cylinders', async () => {
    const cylinders = [await registered(firm), await registered(firm)]
    const shipment = await draft(cylinders, { note: 'Gate 4' })
    expect(shipment).toMatchObject({ state: 'draft', note: 'Gate 4', cylinders: 2, to: { name: 'Tarnvale Reclaim' }, carrier: null })
    // 40.0 - 27.5 = 12.5 lb = 5669.9 g a cylinder.
    expect(shipment.netGrams).toBe(11_340)
    expect(shipment.lines.map(line => [line.because, line.weighed])).toEqual([[[], null], [[], null]])

    const isReady = await ready(shipment.id, cylinders, lb(39))
    expect(isReady).toMatchObject({ state: 'ready', carrier: { id: null } })
    // 39.0 - 27.5 = 11.5 lb = 5216.3 g.
    expect(isReady.lines[1]!.weighed).toMatchObject({ gross: lb(39), netGrams: 5_216, by: 'Wes', isStale: false })
    const sent = await dispatched(shipment.id, weighedOut(cylinders, lb(39)))
    expect(sent.status).toBe(200)
    expect(sent.body).toMatchObject({ state: 'dispatched', dispatchedBy: 'Mona' })
    // 39.0 lb = 17690.1 g.
    expect(sent.body.lines[0]!.sent).toEqual({ gross: lb(39), grossGrams: 17_690, refrigerant: 'R-22', condition: 'clean', netGrams: 5_216 })
    const away = await cylinderNow(firm.auditor.client, cylinders[0]!.id)
    expect(away).toMatchObject({ lifecycle: 'at-reclaim', place: { name: 'Tarnvale Reclaim' }, contents: { inStock: false } })
    expect(await actsOf(shipment.id)).toEqual([
      'created by Wes', 'weighed by Wes', 'weighed by Wes', 'carrier-chosen by Wes', 'ready by Wes', 'dispatched by Mona',
    ])

    // By a clock that runs far ahead; it arrived when that was told, and not later.
    const arrival = { ...act(), occurredAt: '2199-01-01T00:00:00Z' }
    const arrived = await firm.manager.client.post<ShipmentWithLines>(`/api/shipments/${shipment.id}/arrival`, arrival)
    expect(arrived.body.state).toBe('arrived')
    expect(Date.parse(arrived.body.arrivedAt!)).toBeLessThanOrEqual(Date.now())
    expect((await firm.manager.client.post(`/api/shipments/${shipment.id}/arrival`, arrival)).status).toBe(200)
    expect((await firm.manager.client.post(`/api/shipments/${shipment.id}/arrival`, act())).status).toBe(409)
    expect((await actsOf(shipment.id)).filter(one => one.startsWith('arrived'))).toEqual(['arrived by Mona'])

    await settledWith(firm.manager.client, shipment.id, { theirGross: lb(38.9), acceptedNet: lb(11), grade: 'A', rate: { mills: 12_500, per: 'lb' } })
    const received = await shown(shipment.id)
    expect(received.state).toBe('settled')
    // 38.9 lb = 17644.7 g; 11 lb = 4989.5 g.
    expect(received.lines[1]!.received).toEqual({ theirGrossGrams: 17_645, acceptedNetGrams: 4_990, grade: 'A', price: 12.5, pricePer: 'lb' })
    expect(received.lines[1]!.sent!.netGrams).toBe(5_216)
    expect((await cylinderNow(firm.auditor.client, cylinders[1]!.id)).contents).toMatchObject({ nothingInIt: true, netGrams: 0 })
    const next = await draft(cylinders)
    expect(next.number).toBe(shipment.number + 1)
  })

  it('is named on the cylinder, in the fleet and in the log', async () => {
    const cylinder = await registered(firm)
    const listed = async () => (await firm.technician.client.get<FleetAnswer>(`/api/cylinders?label=${cylinder.labelCode}`)).body.items[0]!
    const stands = async () => (await firm.technician.client.get<OpenListAnswer>(`/api/cylinders/${cylinder.labelCode}/open-list`)).body.list
    expect([(await listed()).openList, await stands()]).toEqual([undefined, null])
    const { id, number } = await readyWith([cylinder])
    const on = { kind: 'shipment', id, number }
    expect([(await listed()).openList, await stands()]).toEqual([on, on])
    await dispatched(id, weighedOut([cylinder]))
    const { items } = (await firm.auditor.client.get<CustodyLogAnswer>(`/api/cylinders/${cylinder.id}/events`)).body
    expect(items[0]!.names[id]).toBe(`shipment ${String(number).padStart(4, '0')}`)
    expect(await stands()).toEqual(on)
  })

  it('is given up with a reason only before it leaves, and frees its cylinders', async () => {
    const cylinder = await registered(firm)
    const shipment = await readyWith([cylinder])
    const giveUp = (body: object) => firm.warehouse.client.post<ShipmentWithLines & ProblemDetails>(`/api/shipments/${shipment.id}/cancel`, body)
    expect((await giveUp(act())).status).toBe(400)
    const body = { ...act(), reason: 'Another takes it' }
    expect((await giveUp(body)).body).toMatchObject({ state: 'cancelled', cancelledAt: body.occurredAt })
    expect((await giveUp(body)).status).toBe(200)
    const onNext = await readyWith([cylinder])
    await dispatched(onNext.id, weighedOut([cylinder]))
    const late = await firm.warehouse.client.post<ProblemDetails>(`/api/shipments/${onNext.id}/cancel`, { ...act(), reason: 'Wrong reclaimer' })
    expect([late.status, late.body.detail]).toEqual([409, 'It has left. What has left can only come back: record each cylinder as it returns.'])
    expect((await cylinderNow(firm.auditor.client, cylinder.id)).lifecycle).toBe('at-reclaim')
  })

  it('keeps its cylinders off every other shipment and test lot until it is cancelled', async () => {
    const cylinder = await registered(firm)
    const shipment = await draft([cylinder])
    const onSecond = await firm.warehouse.client.post<ProblemDetails>('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [cylinder.id] })
    expect(onSecond.status).toBe(409)
    expect(onSecond.body.errors).toEqual([{ path: 'cylinderIds.0', message: `${cylinder.labelCode} stands on shipment ${shipment.number}` }])
    const onLot = await firm.warehouse.client.post('/api/test-lots', { requalifierId: firm.requalifier.id, cylinderIds: [cylinder.id] })
    expect(onLot.status).toBe(409)

    await firm.warehouse.client.post(`/api/shipments/${shipment.id}/cancel`, { ...act(), reason: 'Not wanted' })
    expect((await dispatched(shipment.id, weighedOut([cylinder]))).status).toBe(409)
    await made(firm.warehouse.client, '/api/test-lots', { requalifierId: firm.requalifier.id, cylinderIds: [cylinder.id] })
  })

  it('is made once where its sender asks twice, and another one of the same id is refused', async () => {
    const cylinder = await registered(firm)
    const body = { id: randomUUID(), toFirmId: firm.reclaimer.id, cylinderIds: [cylinder.id], note: 'Monday' }
    const answers = await Promise.all([1, 2, 3].map(() => firm.warehouse.client.post<ShipmentWithLines>('/api/shipments', body)))
    expect(answers.map(answer => answer.status)).toEqual([201, 201, 201])
    expect(new Set(answers.map(answer => answer.body.number)).size).toBe(1)
    expect((await firm.warehouse.client.post('/api/shipments', { ...body, note: 'Tuesday' })).status).toBe(409)
  })

  it('is listed by state, the newest first, page by page', async () => {
    for (let count = 0; count < 3; count++) await draft([])
    const { body } = await firm.auditor.client.get<ShipmentsAnswer>('/api/shipments?state=draft&limit=2')
    expect(body.items).toHaveLength(2)
    expect(body.items[0]!.number).toBeGreaterThan(body.items[1]!.number)
    const next = await firm.auditor.client.get<ShipmentsAnswer>(`/api/shipments?state=draft&limit=2&cursor=${body.nextCursor}`)
    expect(next.body.items[0]!.number).toBeLessThan(body.items[1]!.number)
    expect(next.body.items.every(one => one.state === 'draft')).toBe(true)
    expect((await firm.auditor.client.get('/api/shipments?cursor=x')).status).toBe(400)
  })
})

describe('a shipment that is made ready', () => {
  it('is so only once every line is scanned, weighed and allowed, and somebody carries it', async () => {
    const [first, unlabelled] = [await registered(firm), await registered(firm, { isLabelled: false })]
    const { id } = await draft([first, unlabelled])
    const make = () => firm.warehouse.client.post<ShipmentWithLines & ProblemDetails>(`/api/shipments/${id}/ready`, act())
    const weigh = (ref: string) => firm.warehouse.client.post<ShipmentWithLines & ProblemDetails>(`/api/shipments/${id}/weighings`, { ...act(), ref, gross: lb(40) })
    const wanting = (await make()).body
    expect(wanting).toMatchObject({ status: 409, type: 'held-back' })
    expect(wanting.errors!.map(({ path }) => path)).toEqual(['lines.0', 'lines.1', 'shipment'])

    await weigh(first.labelCode!)
    await weigh(unlabelled.stamp!.serial!)
    await firm.warehouse.client.post(`/api/shipments/${id}/carrier`, { ...act(), carrierId: null })
    const held = (await make()).body
    expect(held.errors).toEqual([{ path: 'lines.1', message: 'It has no label. Label it first, so that the papers and the cylinder name each other.' }])

    expect((await changed(id, { takeOff: [unlabelled.id] }, '')).status).toBe(400)
    expect((await changed(id, { takeOff: [unlabelled.id] }, 'It has no label')).body.lines).toHaveLength(1)
    expect((await make()).body.state).toBe('ready')
    const { items } = (await firm.auditor.client.get<ShipmentActsAnswer>(`/api/shipments/${id}/acts`)).body
    expect(items.find(one => one.kind === 'line-removed')).toMatchObject({ by: 'Wes', cylinder: { id: unlabelled.id }, details: { reason: 'It has no label' } })
    expect((await firm.warehouse.client.post('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [unlabelled.id] })).status).toBe(201)
  })

  it('says of a scanned cylinder that it is not on the list, and takes it on', async () => {
    const [first, strange] = [await registered(firm), await registered(firm)]
    const { id } = await draft([first])
    const weigh = (ref: string) => firm.warehouse.client.post<ShipmentWithLines & ProblemDetails>(`/api/shipments/${id}/weighings`, { ...act(), ref, gross: lb(40) })
    expect((await weigh(strange.labelCode!)).body).toMatchObject({ status: 409, type: 'not-on-list' })
    expect((await weigh('000000000')).status).toBe(404)
    expect((await changed(id, { add: [strange.id] })).body.lines.map(line => line.cylinder.id)).toEqual([first.id, strange.id])
    expect((await weigh(strange.labelCode!)).body.lines[1]!.weighed).toMatchObject({ gross: lb(40) })
  })

  it('keeps each weighing once, the newest counting, from several people at once', async () => {
    const cylinders = await Promise.all([1, 2, 3, 4].map(() => registered(firm)))
    const { id } = await draft(cylinders)
    const weigh = (by: Shop['manager'], body: object) => by.client.post<ShipmentWithLines>(`/api/shipments/${id}/weighings`, body)
    const bodies = cylinders.map((one, index) => ({ ...act(), ref: one.labelCode, gross: lb(39 + index / 10) }))
    await Promise.all(bodies.map((body, index) => weigh(index % 2 ? firm.manager : firm.warehouse, body)))
    expect((await shown(id)).lines.map(line => [line.weighed!.gross, line.weighed!.by])).toEqual([[lb(39), 'Wes'], [lb(39.1), 'Mona'], [lb(39.2), 'Wes'], [lb(39.3), 'Mona']])
    await weigh(firm.manager, { ...act(), ref: cylinders[0]!.labelCode, gross: lb(38.5) })
    // Sent again by a phone that never heard the answer, the first one does not come back.
    expect((await weigh(firm.warehouse, bodies[0]!)).body.lines[0]!.weighed!.gross).toEqual(lb(38.5))
    expect((await actsOf(id)).filter(one => one.startsWith('weighed'))).toHaveLength(5)
  })

  it('is a draft again as soon as a line or a cylinder of it changes', async () => {
    const [first, second] = [await registered(firm), await registered(firm)]
    const shipment = await readyWith([first])
    expect((await changed(shipment.id, { add: [second.id] })).body.state).toBe('draft')
    expect((await ready(shipment.id, [second])).state).toBe('ready')

    await posted(firm.technician.client, [{ ...eventOf(first.id, 'weighed'), details: { gross: lb(40.1) } }])
    const stale = await shown(shipment.id)
    expect(stale.state).toBe('draft')
    expect(stale.lines.map(line => line.weighed!.isStale)).toEqual([true, false])
    const drafts = (await firm.auditor.client.get<ShipmentsAnswer>('/api/shipments?state=draft')).body.items
    expect(drafts.map(one => one.id)).toContain(shipment.id)
    const now = await cylinderNow(firm.auditor.client, first.id)
    expect((await dispatched(shipment.id, weighedOut([now, second]))).status).toBe(409)
    expect((await ready(shipment.id, [now])).state).toBe('ready')
    expect((await dispatched(shipment.id, weighedOut([now, second]))).status).toBe(200)
    expect(await actsOf(shipment.id)).toContain('unready by Wes')
  })

  it('is held back by what its reclaimer does not take, once that is recorded', async () => {
    const reclaimer = await made<Firm>(firm.admin.client, '/api/firms', { name: 'Ellerby Reclaim', kind: 'reclaimer' })
    const cylinder = await registered(firm)
    const { id } = await draft([cylinder], { toFirmId: reclaimer.id })
    expect(await shown(id)).toMatchObject({ isUnasked: true, lines: [{ because: [] }] })
    const terms = {
      refrigerants: [{ designation: 'R-134a', conditions: ['clean'] }], takesMixed: false, takesUnknown: false, takesOverdue: true, specs: null, pressuresPsig: null,
      mostContaminationPercent: null, minimum: null, minimumCylinders: null, pickUpCents: null, note: null,
    }
    await made(firm.manager.client, `/api/firms/${reclaimer.id}/terms`, { fromDay: '2026-01-01', terms })
    expect(await shown(id)).toMatchObject({ isUnasked: false, lines: [{ because: [{ code: 'not-shippable', text: 'The reclaimer does not take R-22.' }] }] })
    await expect(ready(id, [cylinder])).rejects.toThrow('The reclaimer does not take R-22.')
  })

  it('is not where the weight just read shows an overfill', async () => {
    const cylinder = await registered(firm)
    const { id } = await draft([cylinder])
    // 0.80 x 47.6 = 38.08 lb at most; 70.0 - 27.5 = 42.5 lb.
    await expect(ready(id, [cylinder], lb(70))).rejects.toThrow('409')
    expect((await shown(id)).lines[0]!.because.map(({ code }) => code)).toEqual(['overfill'])
  })
})

describe('a shipment that is sent off', () => {
  it('answers a repeated dispatch as before, and refuses another one', async () => {
    const cylinders = [await registered(firm)]
    const shipment = await readyWith(cylinders)
    const body = weighedOut(cylinders)
    const first = await dispatched(shipment.id, body)
    const second = await dispatched(shipment.id, body)
    expect([first.status, second.status]).toEqual([200, 200])
    expect(second.body).toEqual(first.body)
    expect((await dispatched(shipment.id, weighedOut(cylinders))).body).toMatchObject({ status: 409, type: 'already-left', detail: 'Mona sent it off. Nothing was recorded a second time.' })
    const other = { ...body, lines: body.lines.map(line => ({ ...line, gross: lb(38) })) }
    expect((await dispatched(shipment.id, other)).status).toBe(409)
    expect((await cylinderNow(firm.auditor.client, cylinders[0]!.id)).version).toBe(first.body.lines[0]!.version)
  })

  it('leaves once where two people send it off at the same moment: one wins, the other is told', async () => {
    for (let round = 0; round < 8; round++) {
      const cylinders = [await registered(firm), await registered(firm)]
      const shipment = await readyWith(cylinders)
      const answers = await Promise.all([weighedOut(cylinders), weighedOut(cylinders), weighedOut(cylinders)].map(body => dispatched(shipment.id, body)))
      expect(answers.map(answer => answer.status).sort()).toEqual([200, 409, 409])
      for (const { status, body } of answers) if (status === 409) expect(body.title).toBe('It has left already')
      const { version } = await cylinderNow(firm.auditor.client, cylinders[0]!.id)
      expect(version).toBe(cylinders[0]!.version + 1)
      expect((await actsOf(shipment.id)).filter(one => one.startsWith('dispatched'))).toHaveLength(1)
    }
  })

  it('never leaves twice on two shipments: one takes the cylinder, the other is told on which it stands', async () => {
    for (let round = 0; round < 8; round++) {
      const cylinder = await registered(firm)
      const ship = async (by: Shop['manager']) => {
        const made = await by.client.post<ShipmentWithLines & ProblemDetails>('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [cylinder.id] })
        if (made.status !== 201) return made
        await readied(by.client, made.body.id, [{ cylinderId: cylinder.id, gross: lb(40) }])
        return dispatched(made.body.id, weighedOut([cylinder]))
      }
      const answers = await Promise.all([ship(firm.manager), ship(firm.warehouse)])
      expect(answers.map(answer => answer.status).sort()).toEqual([200, 409])
      expect(JSON.stringify(answers.find(answer => answer.status === 409)!.body)).toContain(`${cylinder.labelCode} stands on shipment`)
      expect((await cylinderNow(firm.auditor.client, cylinder.id)).version).toBe(cylinder.version + 1)
    }
  })

  it('does not leave at all where one cylinder has changed since it was looked at', async () => {
    const cylinders = [await registered(firm), await registered(firm)]
    const shipment = await readyWith(cylinders)
    await posted(firm.technician.client, [{ ...eventOf(cylinders[1]!.id, 'weighed'), details: { gross: lb(40.1) } }])
    const answer = await dispatched(shipment.id, weighedOut(cylinders))
    expect(answer.status).toBe(409)
    expect(await cylinderNow(firm.auditor.client, cylinders[0]!.id)).toMatchObject({ version: cylinders[0]!.version, lifecycle: 'in-service' })
    expect(await shown(shipment.id)).toMatchObject({ state: 'draft', dispatchedAt: null, lines: [{ sent: null }, { sent: null }] })
  })

  it('names exactly the lines and weights that it was made ready with', async () => {
    const [first, second] = [await registered(firm), await registered(firm)]
    const shipment = await readyWith([first, second])
    expect((await dispatched(shipment.id, weighedOut([first]))).body.title).toBe('The lines have changed')
    expect((await dispatched(shipment.id, weighedOut([first, second], lb(41)))).body.errors).toMatchObject([{ path: 'lines.0.gross' }, { path: 'lines.1.gross' }])
    expect((await dispatched(shipment.id, weighedOut([first, second]))).status).toBe(200)
    expect((await changed(shipment.id, { takeOff: [first.id] })).status).toBe(409)
    expect((await firm.warehouse.client.post(`/api/shipments/${shipment.id}/carrier`, { ...act(), carrierId: null })).status).toBe(409)
  })

  it('stays where its papers lack an emergency telephone', async () => {
    const cylinder = await registered(firm)
    const shipment = await readyWith([cylinder])
    await firm.admin.client.patch('/api/firm', { emergencyTelephone: null })
    const answer = await dispatched(shipment.id, weighedOut([cylinder]))
    await firm.admin.client.patch('/api/firm', { emergencyTelephone: '+1 555 0142' })
    expect(answer.body).toMatchObject({ status: 409, type: 'held-back' })
    expect(answer.body.detail).toContain('No emergency telephone is set.')
    expect((await dispatched(shipment.id, weighedOut([cylinder]))).status).toBe(200)
  })
})

describe('cylinders of a shipment that come back', () => {
  const back = (cylinders: CylinderView[], gross = lb(40)) => ({
    occurredAt: new Date().toISOString(), placeId: firm.shop.id, reason: 'Refused at the dock',
    lines: cylinders.map(one => ({ cylinderId: one.id, eventId: randomUUID(), gross })),
  })
  const takeBack = (id: string, body: object) => firm.warehouse.client.post<ShipmentWithLines & ProblemDetails>(`/api/shipments/${id}/returns`, body)

  it('are weighed in and free again, while the shipment goes on with the rest', async () => {
    const [first, second] = [await registered(firm), await registered(firm)]
    const shipment = await readyWith([first, second])
    expect((await takeBack(shipment.id, back([first]))).status).toBe(409)
    await dispatched(shipment.id, weighedOut([first, second]))
    const body = back([first])
    const one = await takeBack(shipment.id, body)
    expect(one.body).toMatchObject({ state: 'dispatched', lines: [{ returnedAt: body.occurredAt }, { returnedAt: null }] })
    // 40.0 - 27.5 = 12.5 lb = 5669.9 g; what it is nobody knows after a reclaimer had it.
    expect(await cylinderNow(firm.auditor.client, first.id)).toMatchObject({ lifecycle: 'in-service', place: { name: 'North shop' }, contents: { refrigerant: null, netGrams: 5_670, inStock: true } })
    expect((await takeBack(shipment.id, body)).body).toEqual(one.body)
    expect((await takeBack(shipment.id, back([first]))).body.errors).toEqual([{ path: 'lines.0.cylinderId', message: 'came back already' }])
    expect((await firm.warehouse.client.post('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [first.id] })).status).toBe(201)
    expect((await firm.warehouse.client.post('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [second.id] })).status).toBe(409)
  })

  it('close it with the last of them, for there is nothing to settle', async () => {
    const cylinders = [await registered(firm), await registered(firm)]
    const shipment = await readyWith(cylinders)
    await dispatched(shipment.id, weighedOut(cylinders))
    await takeBack(shipment.id, back([cylinders[0]!]))
    expect((await takeBack(shipment.id, back([cylinders[1]!]))).body).toMatchObject({ state: 'closed', settledAt: null })
    expect((await actsOf(shipment.id)).slice(-3)).toEqual(['returned by Wes', 'returned by Wes', 'closed by Wes'])
  })

  it('come back once where two people take the same one back at the same moment', async () => {
    const [first, second] = [await registered(firm), await registered(firm)]
    const shipment = await readyWith([first, second])
    await dispatched(shipment.id, weighedOut([first, second]))
    const answers = await Promise.all([takeBack(shipment.id, back([first])), takeBack(shipment.id, back([first]))])
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409])
    expect((await actsOf(shipment.id)).filter(one => one.startsWith('returned'))).toHaveLength(1)
  })
})

describe('who may do what with a shipment', () => {
  it('is dispatched and received by a manager, prepared by the warehouse, read by an auditor', async () => {
    const cylinder = await registered(firm)
    const shipment = await draft([cylinder])
    const path = `/api/shipments/${shipment.id}`
    const { warehouse, technician, auditor, admin } = firm
    expect((await warehouse.client.post(`${path}/dispatch`, weighedOut([cylinder]))).status).toBe(403)
    for (const person of [technician, admin]) {
      expect((await person.client.get(path)).status).toBe(403)
      expect((await person.client.get('/api/shipments')).status).toBe(403)
    }
    expect((await auditor.client.get(path)).status).toBe(200)
    expect((await auditor.client.post('/api/shipments', { toFirmId: firm.reclaimer.id })).status).toBe(403)
    expect((await auditor.client.patch(`${path}/lines`, { occurredAt: act().occurredAt })).status).toBe(403)
    for (const what of ['cancel', 'ready', 'weighings', 'carrier', 'returns', 'arrival']) {
      expect((await auditor.client.post(`${path}/${what}`, act())).status, what).toBe(403)
      expect((await technician.client.post(`${path}/${what}`, act())).status, what).toBe(403)
    }
    expect((await warehouse.client.post(`${path}/arrival`, act())).status).toBe(403)
    expect((await technician.client.get(`${path}/acts`)).status).toBe(403)
    expect((await cylinderNow(auditor.client, cylinder.id)).version).toBe(cylinder.version)
  })

  it('names nothing that nobody knows', async () => {
    const { client } = firm.manager
    expect((await client.get(`/api/shipments/${randomUUID()}`)).status).toBe(404)
    expect((await client.get(`/api/shipments/${randomUUID()}/acts`)).status).toBe(404)
    expect((await client.post(`/api/shipments/${randomUUID()}/ready`, act())).status).toBe(404)
    expect((await client.post(`/api/shipments/${randomUUID()}/dispatch`, weighedOut([await registered(firm)]))).status).toBe(404)
    expect((await client.post('/api/shipments', { toFirmId: firm.requalifier.id })).status).toBe(422)
    expect((await client.post('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [randomUUID()] })).status).toBe(422)
    expect((await client.post('/api/shipments', { toFirmId: firm.reclaimer.id, colour: 'red' })).status).toBe(400)
  })
})
