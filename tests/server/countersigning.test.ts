import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CountersigningAnswer } from '../../utils/contract/countersigning'
import type { CylinderView, EventsAnswer } from '../../utils/contract/custody'
import { addMember, type Member } from '../helpers/firm'
import { openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let firm: Shop
let trainee: Member
let cylinder: CylinderView
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  await firm.admin.client.patch(`/api/people/${firm.technician.id}`, { certificationType: 'II' })
  trainee = await addMember(firm.admin, 'Perry', ['technician'], { trainee: true })
  cylinder = await registered(firm)
})
afterAll(() => server.stop())

async function post(by: Member, kind: string, details: object, more: object = {}) {
  const event = { id: randomUUID(), cylinderId: cylinder.id, kind, occurredAt: new Date().toISOString(), ...more, details }
  const { body } = await by.client.post<EventsAnswer>('/api/events', { events: [event] })
  return { ...body.results[0]!, view: body.cylinders[0] }
}

const waiting = async (by: Member, query = '') => (await by.client.get<CountersigningAnswer>(`/api/countersigning${query}`)).body

describe('what waits for a supervisor', () => {
  it('is listed for that supervisor alone, each entry with what it recorded, the first recorded first', async () => {
    const first = await post(trainee, 'weighed', { gross: lb(40) }, { supervisorId: firm.technician.id, note: 'with Tina' })
    const second = await post(trainee, 'drawn', { grossAfter: lb(37), purpose: 'same-owner' }, { supervisorId: firm.technician.id })
    const listed = await waiting(firm.technician)
    expect(listed.items.map(({ line }) => line.id)).toEqual([first.id, second.id])
    expect(listed).toMatchObject({ total: 2, nextCursor: null })
    expect(listed.items[0]).toMatchObject({ cylinder: { id: cylinder.id, labelCode: cylinder.labelCode }, line: { kind: 'weighed', author: { name: 'Perry' }, note: 'with Tina', signature: { by: null } } })
    expect(await waiting(firm.manager)).toMatchObject({ items: [], total: 0 })
    expect(await waiting(trainee)).toMatchObject({ items: [], total: 0 })
  })

  it('comes page by page, and of one cylinder by its code', async () => {
    const page = await waiting(firm.technician, '?limit=1')
    expect(page).toMatchObject({ total: 2, items: [{ line: { kind: 'weighed' } }] })
    expect(await waiting(firm.technician, `?limit=1&cursor=${page.nextCursor}`)).toMatchObject({ nextCursor: null, items: [{ line: { kind: 'drawn' } }] })
    expect(await waiting(firm.technician, `?cylinder=${cylinder.labelCode}`)).toMatchObject({ total: 2 })
    const other = await registered(firm)
    expect(await waiting(firm.technician, `?cylinder=${other.id}`)).toMatchObject({ total: 0 })
    expect((await firm.technician.client.get('/api/countersigning?cylinder=000000000')).status).toBe(404)
    expect((await firm.technician.client.get('/api/countersigning?cursor=x')).status).toBe(400)
  })

  it('is nothing for who records nothing, and closed to who is not signed in', async () => {
    for (const by of [firm.auditor, firm.admin]) expect(await waiting(by)).toEqual({ items: [], nextCursor: null, total: 0 })
    expect((await fetch(`${server.baseUrl}/api/countersigning`)).status).toBe(401)
  })

  it('is signed by that supervisor, and by no manager, nor by the trainee', async () => {
    const [{ line }] = (await waiting(firm.technician)).items as [CountersigningAnswer['items'][0]]
    for (const by of [firm.manager, firm.warehouse, trainee]) expect(await post(by, 'countersigned', { eventId: line.id })).toMatchObject({ outcome: 'refused', problem: { status: 403 } })
    const signed = await post(firm.technician, 'countersigned', { eventId: line.id })
    expect(signed).toMatchObject({ outcome: 'accepted' })
    expect(signed.view!.waitsForSignatureOf).toEqual([firm.technician.id])
    expect((await waiting(firm.technician)).items.map(({ line: { kind } }) => kind)).toEqual(['drawn'])
  })

  it('waits again once a signature was taken back, and once a trainee has corrected what was signed', async () => {
    const [{ line }] = (await waiting(firm.technician)).items as [CountersigningAnswer['items'][0]]
    const signed = await post(firm.technician, 'countersigned', { eventId: line.id })
    expect(signed.view).toMatchObject({ waitsForSignatureOf: [] })
    expect(signed.view!.findings.map(({ code }) => code)).not.toContain('unsigned')
    await post(firm.technician, 'corrected', { eventId: signed.id, reason: 'signed the wrong one' })
    expect((await waiting(firm.technician)).total).toBe(1)
    await post(firm.technician, 'countersigned', { eventId: line.id })
    expect((await waiting(firm.technician)).total).toBe(0)
    await post(trainee, 'corrected', { eventId: line.id, reason: 'typed 37 for 38', instead: { grossAfter: lb(38), purpose: 'same-owner' } }, { supervisorId: firm.technician.id })
    expect((await waiting(firm.technician)).items.map(({ line: { id } }) => id)).toEqual([line.id])
  })
})
