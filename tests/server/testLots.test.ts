import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CustodyLogAnswer } from '../../utils/contract/custody'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { TestLotsAnswer, TestLotWithLines } from '../../utils/contract/testLots'
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

const THIS_MONTH = new Date().toISOString().slice(0, 7)

function empty(): Promise<CylinderView> {
  return registered(firm, { contents: 'evacuated', marks: [{ month: '2019-03' }] })
}

function draft(cylinders: CylinderView[]): Promise<TestLotWithLines> {
  return made(firm.warehouse.client, '/api/test-lots', { requalifierId: firm.requalifier.id, cylinderIds: cylinders.map(one => one.id) })
}

function sendingOff(cylinders: CylinderView[]) {
  return {
    occurredAt: new Date().toISOString(),
    lines: cylinders.map(one => ({ cylinderId: one.id, eventId: randomUUID(), expects: one.version })),
  }
}

function dispatched(id: string, body: object) {
  return firm.manager.client.post<TestLotWithLines & ProblemDetails>(`/api/test-lots/${id}/dispatch`, body)
}

/** A lot of these cylinders that is at the test station. */
async function sentOff(cylinders: CylinderView[]): Promise<TestLotWithLines> {
  const lot = await draft(cylinders)
  const answer = await dispatched(lot.id, sendingOff(cylinders))
  if (answer.status !== 200) throw new Error(`The dispatch answered ${answer.status}: ${JSON.stringify(answer.body)}`)
  return answer.body
}

function backFromTest(...lines: [CylinderView, object][]) {
  return {
    occurredAt: new Date().toISOString(),
    toPlaceId: firm.shop.id,
    lines: lines.map(([cylinder, found]) => ({
      cylinderId: cylinder.id, retestedEventId: randomUUID(), returnedEventId: randomUUID(), method: 'volumetric', month: THIS_MONTH, ...found,
    })),
  }
}

function returned(id: string, body: object) {
  return firm.manager.client.post<TestLotWithLines & ProblemDetails>(`/api/test-lots/${id}/return`, body)
}

describe('a lot for the test station', () => {
  it('comes back line by line, each with what the test found', async () => {
    const [good, bad] = [await empty(), await empty()]
    const lot = await sentOff([good, bad])
    expect(lot).toMatchObject({ state: 'sent', requalifier: { name: 'Ostwick Cylinder Tests', rin: 'A123' }, cylinders: 2, backAt: null })
    expect(await cylinderNow(firm.auditor.client, good.id)).toMatchObject({ lifecycle: 'at-test', place: { name: 'Ostwick Cylinder Tests' } })

    const first = await returned(lot.id, backFromTest([good, { result: 'passed', newTare: lb(27.4), rin: 'b765', suffix: '+' }]))
    expect(first.status).toBe(200)
    expect(first.body).toMatchObject({ state: 'sent', backAt: null })
    expect(first.body.lines.map(line => [line.open, line.result])).toEqual([[false, { result: 'passed', month: THIS_MONTH }], [true, null]])
    expect(await cylinderNow(firm.auditor.client, good.id)).toMatchObject({
      lifecycle: 'in-service', place: { name: 'North shop' }, holds: ['wet'], requalification: { lastMonth: THIS_MONTH, state: 'in-date' },
      // 27.4 lb = 12428.4 g.
      stamp: { tareWeightGrams: 12_428 },
      marks: [{ month: '2019-03' }, { month: THIS_MONTH, method: 'volumetric', rin: 'B765', suffix: '+' }],
    })

    const second = await returned(lot.id, backFromTest([bad, { result: 'condemned' }]))
    expect(second.body.state).toBe('back')
    expect(second.body.backAt).not.toBeNull()
    expect(second.body.lines[1]).toMatchObject({ open: false, result: { result: 'condemned' } })
    const condemned = await cylinderNow(firm.auditor.client, bad.id)
    expect(condemned).toMatchObject({ lifecycle: 'condemned', place: { name: 'North shop' } })
    expect(condemned.findings.map(finding => finding.code)).not.toContain('after-end')
  })

  it('answers a repeated dispatch and a repeated return as before, and refuses others', async () => {
    const cylinder = await empty()
    const lot = await draft([cylinder])
    const leaving = sendingOff([cylinder])
    const [first, second] = [await dispatched(lot.id, leaving), await dispatched(lot.id, leaving)]
    expect(first.status).toBe(200)
    expect(second.body).toEqual(first.body)
    expect((await dispatched(lot.id, sendingOff([cylinder]))).status).toBe(409)

    const coming = backFromTest([cylinder, { result: 'rejected' }])
    const [third, fourth] = [await returned(lot.id, coming), await returned(lot.id, coming)]
    expect(third.status).toBe(200)
    expect(fourth.body).toEqual(third.body)
    expect((await returned(lot.id, backFromTest([cylinder, { result: 'passed' }]))).status).toBe(409)
    const { body } = await firm.auditor.client.get<CustodyLogAnswer>(`/api/cylinders/${cylinder.id}/events`)
    expect(body.items.map(line => line.kind)).toEqual(['returned', 'retested', 'sent-for-test', 'labelled', 'registered'])
    expect((await cylinderNow(firm.auditor.client, cylinder.id)).lifecycle).toBe('rejected')
  })

  it('takes each line back once where two people record it at the same moment', async () => {
    const cylinder = await empty()
    const lot = await sentOff([cylinder])
    const answers = await Promise.all([1, 2, 3].map(() => returned(lot.id, backFromTest([cylinder, { result: 'passed' }]))))
    expect(answers.map(answer => answer.status).sort()).toEqual([200, 409, 409])
    const { body } = await firm.auditor.client.get<CustodyLogAnswer>(`/api/cylinders/${cylinder.id}/events`)
    expect(body.items.filter(line => line.kind === 'retested')).toHaveLength(1)
  })

  it('shows a result as it was corrected', async () => {
    const cylinder = await empty()
    const lot = await sentOff([cylinder])
    const coming = backFromTest([cylinder, { result: 'rejected' }])
    await returned(lot.id, coming)
    const { version } = await cylinderNow(firm.manager.client, cylinder.id)
    await posted(firm.manager.client, [{
      ...eventOf(cylinder.id, 'corrected'), expects: version, details: {
        eventId: coming.lines[0]!.retestedEventId, reason: 'Wrong line of the report',
        instead: { month: THIS_MONTH, method: 'volumetric', result: 'passed', requalifierId: firm.requalifier.id },
      },
    }])
    const { body } = await firm.auditor.client.get<TestLotWithLines>(`/api/test-lots/${lot.id}`)
    expect(body.lines[0]!.result).toEqual({ result: 'passed', month: THIS_MONTH })
  })

  it('does not leave with a cylinder that holds something', async () => {
    const [full, clean] = [await registered(firm, { marks: [{ month: '2019-03' }] }), await empty()]
    const lot = await draft([full, clean])
    expect(lot.lines[0]!.because.length).toBeGreaterThan(0)
    expect(lot.lines[1]!.because).toEqual([])
    const answer = await dispatched(lot.id, sendingOff([full, clean]))
    expect(answer.status).toBe(409)
    expect(answer.body.type).toBe('held-back')
    expect(new Set(answer.body.errors!.map(error => error.path))).toEqual(new Set(['lines.0']))
    expect(await cylinderNow(firm.auditor.client, clean.id)).toMatchObject({ version: clean.version, lifecycle: 'in-service' })
  })

  it('does not leave at all where one cylinder has changed since it was looked at', async () => {
    const [first, second] = [await empty(), await empty()]
    const lot = await draft([first, second])
    await posted(firm.technician.client, [{ ...eventOf(second.id, 'weighed'), details: { gross: lb(27.5) } }])
    const answer = await dispatched(lot.id, sendingOff([first, second]))
    expect(answer.status).toBe(409)
    expect(answer.body.errors).toMatchObject([{ path: 'lines.1' }])
    expect((await cylinderNow(firm.auditor.client, first.id)).version).toBe(first.version)
  })

  it('keeps its cylinders off shipments until they are back', async () => {
    const cylinder = await empty()
    const lot = await sentOff([cylinder])
    const shipment = { toFirmId: firm.reclaimer.id, cylinderIds: [cylinder.id] }
    const refused = await firm.warehouse.client.post<ProblemDetails>('/api/shipments', shipment)
    expect(refused.status).toBe(409)
    expect(refused.body.errors![0]!.message).toBe(`${cylinder.labelCode} stands on test lot ${lot.number}`)
    await returned(lot.id, backFromTest([cylinder, { result: 'passed' }]))
    expect((await firm.warehouse.client.post('/api/shipments', shipment)).status).toBe(201)
  })

  it('comes back only with its own lines, and to a place of ours', async () => {
    const [mine, other] = [await empty(), await empty()]
    const lot = await sentOff([mine])
    expect((await returned(lot.id, backFromTest([other, { result: 'passed' }]))).status).toBe(409)
    const elsewhere = { ...backFromTest([mine, { result: 'passed' }]), toPlaceId: firm.reclaimer.placeId }
    expect((await returned(lot.id, elsewhere)).status).toBe(422)
    expect((await cylinderNow(firm.auditor.client, mine.id)).lifecycle).toBe('at-test')
  })

  it('is changed and cancelled while a draft only', async () => {
    const [first, second] = [await empty(), await empty()]
    const lot = await draft([first])
    const changed = await firm.warehouse.client.put<TestLotWithLines>(`/api/test-lots/${lot.id}/lines`, { cylinderIds: [second.id] })
    expect(changed.body.lines.map(line => line.cylinder.id)).toEqual([second.id])
    expect((await firm.warehouse.client.put(`/api/test-lots/${lot.id}/lines`, { cylinderIds: [second.id, second.id] })).status).toBe(400)
    expect((await dispatched(lot.id, sendingOff([second]))).status).toBe(200)
    expect((await firm.warehouse.client.put(`/api/test-lots/${lot.id}/lines`, { cylinderIds: [] })).status).toBe(409)
    expect((await firm.warehouse.client.post(`/api/test-lots/${lot.id}/cancel`)).status).toBe(409)
    const dropped = await draft([first])
    expect((await firm.warehouse.client.post<TestLotWithLines>(`/api/test-lots/${dropped.id}/cancel`)).body.state).toBe('cancelled')
    const { body } = await firm.auditor.client.get<TestLotsAnswer>('/api/test-lots?state=cancelled')
    expect(body.items.map(one => one.id)).toEqual([dropped.id])
  })
})

describe('who may do what with a test lot', () => {
  it('is dispatched and taken back by a manager, prepared by the warehouse, read by an auditor', async () => {
    const cylinder = await empty()
    const lot = await draft([cylinder])
    const path = `/api/test-lots/${lot.id}`
    for (const person of [firm.warehouse, firm.auditor, firm.technician, firm.admin]) {
      expect((await person.client.post(`${path}/dispatch`, sendingOff([cylinder]))).status).toBe(403)
      expect((await person.client.post(`${path}/return`, backFromTest([cylinder, { result: 'passed' }]))).status).toBe(403)
    }
    for (const person of [firm.technician, firm.admin]) expect((await person.client.get(path)).status).toBe(403)
    expect((await firm.auditor.client.get(path)).status).toBe(200)
    expect((await firm.auditor.client.post(`${path}/cancel`)).status).toBe(403)
    expect((await firm.auditor.client.post('/api/test-lots', { requalifierId: firm.requalifier.id })).status).toBe(403)
    expect((await firm.manager.client.get(`/api/test-lots/${randomUUID()}`)).status).toBe(404)
    expect((await firm.manager.client.post('/api/test-lots', { requalifierId: firm.reclaimer.id })).status).toBe(422)
  })
})
