import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { ShipmentsAnswer, ShipmentWithLines } from '../../utils/contract/shipments'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { cylinderNow, eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
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

/** A dispatch of these cylinders at the weights they were registered with. */
function weighedOut(cylinders: CylinderView[], gross = lb(40)) {
  return {
    occurredAt: new Date().toISOString(),
    lines: cylinders.map(one => ({ cylinderId: one.id, eventId: randomUUID(), expects: one.version, gross })),
  }
}

function dispatched(id: string, body: object) {
  return firm.manager.client.post<ShipmentWithLines & ProblemDetails>(`/api/shipments/${id}/dispatch`, body)
}

describe('a shipment to a reclaimer', () => {
  it('leaves with the weight of each line, is received with the reclaimer\'s, and frees its cylinders', async () => {
    const cylinders = [await registered(firm), await registered(firm)]
    const shipment = await draft(cylinders, { note: 'Gate 4' })
    expect(shipment).toMatchObject({ state: 'draft', note: 'Gate 4', cylinders: 2, to: { name: 'Tarnvale Reclaim' } })
    // 40.0 - 27.5 = 12.5 lb = 5669.9 g a cylinder.
    expect(shipment.netGrams).toBe(11_340)
    expect(shipment.lines.map(line => line.because)).toEqual([[], []])

    const sent = await dispatched(shipment.id, weighedOut(cylinders, lb(39)))
    expect(sent.status).toBe(200)
    expect(sent.body).toMatchObject({ state: 'dispatched', dispatchedBy: 'Mona' })
    // 39.0 lb = 17690.1 g; 39.0 - 27.5 = 11.5 lb = 5216.3 g.
    expect(sent.body.lines[0]!.sent).toEqual({ gross: lb(39), grossGrams: 17_690, refrigerant: 'R-22', condition: 'clean', netGrams: 5_216 })
    const away = await cylinderNow(firm.auditor.client, cylinders[0]!.id)
    expect(away).toMatchObject({ lifecycle: 'at-reclaim', place: { name: 'Tarnvale Reclaim' }, contents: { inStock: false } })

    const receipt = {
      occurredAt: new Date().toISOString(),
      lines: sent.body.lines.map(line => ({
        cylinderId: line.cylinder.id, eventId: randomUUID(), expects: line.version, theirGross: lb(38.9), acceptedNet: lb(11), grade: 'A', price: 12.5,
      })),
    }
    const received = await firm.manager.client.post<ShipmentWithLines>(`/api/shipments/${shipment.id}/receipt`, receipt)
    expect(received.status).toBe(200)
    expect(received.body.state).toBe('settled')
    // 38.9 lb = 17644.7 g; 11 lb = 4989.5 g.
    expect(received.body.lines[1]!.received).toEqual({ theirGrossGrams: 17_645, acceptedNetGrams: 4_990, grade: 'A', price: 12.5 })
    expect(received.body.lines[1]!.sent!.netGrams).toBe(5_216)
    expect((await cylinderNow(firm.auditor.client, cylinders[1]!.id)).contents).toMatchObject({ nothingInIt: true, netGrams: 0 })

    const again = await firm.manager.client.post<ShipmentWithLines>(`/api/shipments/${shipment.id}/receipt`, receipt)
    expect(again.status).toBe(200)
    expect(again.body).toEqual(received.body)
    const next = await draft(cylinders)
    expect(next.number).toBe(shipment.number + 1)
  })

  it('answers a repeated dispatch as before, and refuses another one', async () => {
    const cylinders = [await registered(firm)]
    const shipment = await draft(cylinders)
    const body = weighedOut(cylinders)
    const first = await dispatched(shipment.id, body)
    const second = await dispatched(shipment.id, body)
    expect([first.status, second.status]).toEqual([200, 200])
    expect(second.body).toEqual(first.body)
    expect((await dispatched(shipment.id, weighedOut(cylinders))).status).toBe(409)
    const changed = { ...body, lines: body.lines.map(line => ({ ...line, gross: lb(38) })) }
    expect((await dispatched(shipment.id, changed)).status).toBe(409)
    expect((await cylinderNow(firm.auditor.client, cylinders[0]!.id)).version).toBe(first.body.lines[0]!.version)
  })

  it('leaves once where two people send it off at the same moment', async () => {
    const cylinders = [await registered(firm), await registered(firm)]
    const shipment = await draft(cylinders)
    const answers = await Promise.all([weighedOut(cylinders), weighedOut(cylinders), weighedOut(cylinders)].map(body => dispatched(shipment.id, body)))
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409, 409])
    const { version } = await cylinderNow(firm.auditor.client, cylinders[0]!.id)
    expect(version).toBe(cylinders[0]!.version + 1)
  })

  it('does not leave at all where one cylinder has changed since it was looked at', async () => {
    const cylinders = [await registered(firm), await registered(firm)]
    const shipment = await draft(cylinders)
    await posted(firm.technician.client, [{ ...eventOf(cylinders[1]!.id, 'weighed'), details: { gross: lb(40.1) } }])
    const answer = await dispatched(shipment.id, weighedOut(cylinders))
    expect(answer.status).toBe(409)
    expect(answer.body.errors).toMatchObject([{ path: 'lines.1' }])
    const untouched = await cylinderNow(firm.auditor.client, cylinders[0]!.id)
    expect(untouched).toMatchObject({ version: cylinders[0]!.version, lifecycle: 'in-service' })
    const { body } = await firm.auditor.client.get<ShipmentWithLines>(`/api/shipments/${shipment.id}`)
    expect(body).toMatchObject({ state: 'draft', dispatchedAt: null })
    expect(body.lines.map(line => line.sent)).toEqual([null, null])
  })

  it('does not leave where the weight just read shows an overfill', async () => {
    const cylinders = [await registered(firm), await registered(firm)]
    const shipment = await draft(cylinders)
    const body = weighedOut(cylinders)
    // 0.80 x 47.6 = 38.08 lb at most; 70.0 - 27.5 = 42.5 lb.
    body.lines[1]!.gross = lb(70)
    const answer = await dispatched(shipment.id, body)
    expect(answer.status).toBe(409)
    expect(answer.body).toMatchObject({ type: 'held-back', errors: [{ path: 'lines.1' }] })
    expect((await cylinderNow(firm.auditor.client, cylinders[0]!.id)).lifecycle).toBe('in-service')
  })

  it('shows why a line may not leave, and holds it back', async () => {
    const unlabelled = await registered(firm, { isLabelled: false })
    const shipment = await draft([unlabelled])
    expect(shipment.lines[0]!.because).toHaveLength(1)
    expect((await dispatched(shipment.id, weighedOut([unlabelled]))).body.type).toBe('held-back')
  })

  it('takes other lines while a draft, and a dispatch must name exactly those', async () => {
    const [first, second] = [await registered(firm), await registered(firm)]
    const shipment = await draft([first])
    const changed = await firm.warehouse.client.put<ShipmentWithLines>(`/api/shipments/${shipment.id}/lines`, { cylinderIds: [second.id, first.id] })
    expect(changed.body.lines.map(line => line.cylinder.id)).toEqual([second.id, first.id])
    expect((await dispatched(shipment.id, weighedOut([first]))).status).toBe(409)
    expect((await dispatched(shipment.id, weighedOut([first, second]))).status).toBe(200)
    expect((await firm.warehouse.client.put(`/api/shipments/${shipment.id}/lines`, { cylinderIds: [] })).status).toBe(409)
    expect((await firm.warehouse.client.post(`/api/shipments/${shipment.id}/cancel`)).status).toBe(409)
  })

  it('keeps its cylinders off every other shipment and test lot until it is cancelled', async () => {
    const cylinder = await registered(firm)
    const shipment = await draft([cylinder])
    const onSecond = await firm.warehouse.client.post<ProblemDetails>('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [cylinder.id] })
    expect(onSecond.status).toBe(409)
    expect(onSecond.body.errors).toEqual([{ path: 'cylinderIds.0', message: `${cylinder.labelCode} stands on shipment ${shipment.number}` }])
    const onLot = await firm.warehouse.client.post('/api/test-lots', { requalifierId: firm.requalifier.id, cylinderIds: [cylinder.id] })
    expect(onLot.status).toBe(409)

    const cancelled = await firm.warehouse.client.post<ShipmentWithLines>(`/api/shipments/${shipment.id}/cancel`)
    expect(cancelled.body.state).toBe('cancelled')
    expect((await firm.warehouse.client.post(`/api/shipments/${shipment.id}/cancel`)).status).toBe(200)
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
    const { body } = await firm.auditor.client.get<ShipmentsAnswer>('/api/shipments?state=draft&limit=2')
    expect(body.items).toHaveLength(2)
    expect(body.items[0]!.number).toBeGreaterThan(body.items[1]!.number)
    const next = await firm.auditor.client.get<ShipmentsAnswer>(`/api/shipments?state=draft&limit=2&cursor=${body.nextCursor}`)
    expect(next.body.items[0]!.number).toBeLessThan(body.items[1]!.number)
    expect(next.body.items.every(one => one.state === 'draft')).toBe(true)
    expect((await firm.auditor.client.get('/api/shipments?cursor=x')).status).toBe(400)
  })
})

describe('who may do what with a shipment', () => {
  it('is dispatched and received by a manager, prepared by the warehouse, read by an auditor', async () => {
    const cylinder = await registered(firm)
    const shipment = await draft([cylinder])
    const path = `/api/shipments/${shipment.id}`
    const { warehouse, technician, auditor, admin } = firm
    expect((await warehouse.client.post(`${path}/dispatch`, weighedOut([cylinder]))).status).toBe(403)
    expect((await warehouse.client.post(`${path}/receipt`, weighedOut([cylinder]))).status).toBe(403)
    for (const person of [technician, admin]) {
      expect((await person.client.get(path)).status).toBe(403)
      expect((await person.client.get('/api/shipments')).status).toBe(403)
    }
    expect((await auditor.client.get(path)).status).toBe(200)
    expect((await auditor.client.post('/api/shipments', { toFirmId: firm.reclaimer.id })).status).toBe(403)
    expect((await auditor.client.put(`${path}/lines`, { cylinderIds: [] })).status).toBe(403)
    expect((await auditor.client.post(`${path}/cancel`)).status).toBe(403)
    expect((await cylinderNow(auditor.client, cylinder.id)).version).toBe(cylinder.version)
  })

  it('names nothing that nobody knows', async () => {
    const { client } = firm.manager
    expect((await client.get(`/api/shipments/${randomUUID()}`)).status).toBe(404)
    expect((await client.post(`/api/shipments/${randomUUID()}/dispatch`, weighedOut([await registered(firm)]))).status).toBe(404)
    expect((await client.post('/api/shipments', { toFirmId: firm.requalifier.id })).status).toBe(422)
    expect((await client.post('/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [randomUUID()] })).status).toBe(422)
    expect((await client.post('/api/shipments', { toFirmId: firm.reclaimer.id, colour: 'red' })).status).toBe(400)
  })
})
