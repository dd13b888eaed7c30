import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { FleetAnswer } from '../../utils/contract/custody'
import type { NowAnswer, NowLine } from '../../utils/contract/now'
import type { LogHead } from '../../utils/contract/log'
import type { Place } from '../../utils/contract/places'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { addMember, type Member } from '../helpers/firm'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

let server: TestServer
let firm: Shop
let other: Member
let overfilled: CylinderView
let full: CylinderView

beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  other = await addMember(firm.admin, 'Theo', ['technician'])
  await made<Place>(firm.admin.client, '/api/places', { name: 'Van 12', kind: 'van', technicianId: firm.technician.id })
  // TW 27.5 lb, WC 47.6 lb: R-22 to 38.08 lb net, at 65.58 lb gross. 68.0 lb is 2.42 lb too much, 64.0 lb is 36.5 lb net.
  overfilled = await registered(firm, { gross: lb(68) })
  full = await registered(firm, { gross: lb(64) })
  await registered(firm, { isLabelled: false })
})
afterAll(() => server.stop())

async function linesOf({ client }: Member, query = ''): Promise<NowLine[]> {
  const { status, body } = await client.get<NowAnswer>(`/api/now${query}`)
  expect(status).toBe(200)
  return body.lines
}
const topicsOf = async (member: Member) => (await linesOf(member)).map(({ topic }) => topic)
const lineOf = async (member: Member, topic: string, query = '') => (await linesOf(member, query)).find(line => line.topic === topic)

describe('what needs each person now', () => {
  it('is for the manager what is overfilled and what is full, and nothing of the warehouse\'s labels', async () => {
    expect(await topicsOf(firm.manager)).toEqual(['overfilled', 'full', 'few-empty'])
    expect(await lineOf(firm.manager, 'overfilled')).toMatchObject({
      kind: 'stop', number: 1, sentence: '1 cylinder is overfilled, by 2.5\u00A0lb.', to: `/c/${overfilled.labelCode!.toLowerCase()}/act/drawn`,
    })
    expect(await lineOf(firm.manager, 'full')).toMatchObject({ number: 1, reason: '36.5\u00A0lb of R-22 in North shop.', to: `/shipments?with=${full.id}` })
  })

  it('is for the warehouse also the label that is missing', async () => {
    expect(await topicsOf(firm.warehouse)).toEqual(['overfilled', 'full', 'few-empty', 'unlabelled'])
  })

  it('is said in the unit that is asked for', async () => {
    expect((await lineOf(firm.manager, 'full', '?unit=kg'))!.reason).toBe('16.56\u00A0kg of R-22 in North shop.')
    expect((await firm.manager.client.get('/api/now?unit=stone')).status).toBe(400)
  })

  it('is for a technician what that one holds, and for the other nothing of it', async () => {
    expect(await topicsOf(firm.technician)).toEqual([])
    await posted(firm.warehouse.client, [{ ...eventOf(full.id, 'handed-over'), details: { toHolderId: firm.technician.id } }])
    expect(await lineOf(firm.technician, 'held-full')).toMatchObject({ number: 1, to: `/c/${full.labelCode!.toLowerCase()}/act/moved` })
    expect(await topicsOf(other)).toEqual([])
  })

  it('counts what the list behind it shows', async () => {
    const second = await registered(firm, { gross: lb(67) })
    const line = (await lineOf(firm.manager, 'overfilled'))!
    expect(line).toMatchObject({ number: 2, to: '/fleet?finding=overfill' })
    const { items } = (await firm.manager.client.get<FleetAnswer>(`/api/cylinders?${line.to.split('?')[1]}`)).body
    expect(items.map(({ id }) => id).sort()).toEqual([overfilled.id, second.id].sort())
  })

  it('no longer names a full one that stands on a shipment, but the draft', async () => {
    const draft = await made<{ id: string }>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [full.id] })
    expect(await lineOf(firm.manager, 'full')).toBeUndefined()
    expect(await lineOf(firm.manager, 'shipment-drafts')).toMatchObject({ number: 1, verb: 'Go on with it', to: `/shipments/${draft.id}` })
  })

  it('is for warehouse and manager what a van came back without, until it is seen again', async () => {
    const lost = await registered(firm)
    const van = await made<Place>(firm.admin.client, '/api/places', { name: 'Van 3', kind: 'van', technicianId: other.id })
    await made(firm.warehouse.client, `/api/vans/${van.id}/check-ins`, { id: randomUUID(), found: [], missing: [lost.id] })
    expect(await lineOf(firm.warehouse, 'vans-short')).toMatchObject({ kind: 'unk', number: 1, sentence: 'Van 3 came back 1 short.', to: `/vans/${van.id}` })
    expect(await topicsOf(firm.technician)).not.toContain('vans-short')
    await posted(firm.warehouse.client, [{ ...eventOf(lost.id, 'weighed'), details: { gross: lb(40) } }])
    expect(await lineOf(firm.manager, 'vans-short')).toBeUndefined()
  })

  it('is a shop with fewer than three empty cylinders that may be filled', async () => {
    const empty = () => registered(firm, { contents: 'evacuated' })
    await Promise.all([empty(), empty(), registered(firm, { contents: 'evacuated', marks: [{ month: '2019-01' }] })])
    // One of the three is late for its retest and does not count.
    expect(await lineOf(firm.manager, 'few-empty')).toMatchObject({ number: 1, sentence: 'North shop has 2 empty cylinders that may be filled.', to: `/fleet?place=${firm.shop.id}` })
    await empty()
    expect(await lineOf(firm.manager, 'few-empty')).toBeUndefined()
  })

  it('is for the auditor the log that was never checked, until it is', async () => {
    expect(await topicsOf(firm.auditor)).toEqual(['log-unchecked'])
    expect((await firm.auditor.client.get('/api/log/verify')).status).toBe(200)
    expect(await topicsOf(firm.auditor)).toEqual([])
  })

  it('is for the auditor a correction and an entry of the day before yesterday', async () => {
    const weighing = { ...eventOf(overfilled.id, 'weighed'), occurredAt: new Date(Date.now() - 2 * 86_400_000).toISOString(), details: { gross: lb(68) } }
    const [{ version }] = await posted(firm.warehouse.client, [weighing]) as [CylinderView]
    expect(await topicsOf(firm.auditor)).toEqual(['late-entries'])
    await posted(firm.manager.client, [{ ...eventOf(overfilled.id, 'corrected'), expects: version, details: { eventId: weighing.id, reason: 'read twice' } }])
    expect(await topicsOf(firm.auditor)).toEqual(['late-entries', 'corrections'])
    expect(await lineOf(firm.auditor, 'corrections')).toMatchObject({ number: 1, to: `/c/${overfilled.labelCode!.toLowerCase()}/log` })
  })

  it('is for the administrator who lacks a certification and who has not come yet', async () => {
    await made(firm.admin.client, '/api/people', { name: 'Nora', email: 'nora@harbor.example', roles: ['warehouse'] })
    expect(await topicsOf(firm.admin)).toEqual(['uncertified', 'not-taken-up'])
    expect(await lineOf(firm.admin, 'uncertified')).toMatchObject({ number: 2, reason: expect.stringMatching(/^Theo and Tina\. .*40 CFR 82\.161/) })
    expect(await topicsOf(firm.manager)).toContain('not-taken-up')
  })

  it('is for the supervisor what a trainee recorded, for the manager who has it to sign, until it is taken back', async () => {
    await firm.admin.client.patch(`/api/people/${firm.technician.id}`, { certificationType: 'II' })
    const trainee = await addMember(firm.admin, 'Tom', ['technician'], { trainee: true })
    const weighed = await registered(firm)
    const weighing = { ...eventOf(weighed.id, 'weighed'), supervisorId: firm.technician.id, details: { gross: lb(40) } }
    const [{ version }] = await posted(trainee.client, [weighing]) as [CylinderView]
    expect(await lineOf(firm.technician, 'to-countersign')).toMatchObject({ number: 1, to: '/countersign' })
    expect(await topicsOf(other)).not.toContain('to-countersign')
    expect(await lineOf(firm.manager, 'unsigned')).toMatchObject({ number: 1, reason: expect.stringMatching(/^1 with Tina\./) })
    await posted(firm.manager.client, [{ ...eventOf(weighed.id, 'corrected'), expects: version, details: { eventId: weighing.id, reason: 'another cylinder' } }])
    expect(await lineOf(firm.technician, 'to-countersign')).toBeUndefined()
    expect(await lineOf(firm.manager, 'unsigned')).toBeUndefined()
  })

  it('waits for the supervisor again once the signature was taken back', async () => {
    await firm.admin.client.patch(`/api/people/${other.id}`, { certificationType: 'II' })
    const trainee = await addMember(firm.admin, 'Tess', ['technician'], { trainee: true })
    const { id } = await registered(firm)
    const weighing = { ...eventOf(id, 'weighed'), supervisorId: other.id, details: { gross: lb(40) } }
    const signature = { ...eventOf(id, 'countersigned'), details: { eventId: weighing.id } }
    await posted(trainee.client, [weighing])
    expect(await lineOf(other, 'to-countersign')).toMatchObject({ number: 1 })
    const [{ version }] = await posted(other.client, [signature]) as [CylinderView]
    expect(await lineOf(other, 'to-countersign')).toBeUndefined()
    await posted(other.client, [{ ...eventOf(id, 'corrected'), expects: version, details: { eventId: signature.id, reason: 'signed the wrong one' } }])
    expect(await lineOf(other, 'to-countersign')).toMatchObject({ number: 1 })
  })

  it('is for manager and administrator a scale whose last check is over a year ago, while it is in use', async () => {
    const scale = { accuracy: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.25 }
    const dayAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString().slice(0, 10)
    await made(firm.manager.client, '/api/scales', { name: 'Dock', ...scale, lastCheckOn: dayAgo(360) })
    expect(await topicsOf(firm.manager)).not.toContain('scale-checks')
    const bench = await made<{ id: string }>(firm.manager.client, '/api/scales', { name: 'Bench', ...scale, lastCheckOn: dayAgo(370) })
    for (const who of [firm.manager, firm.admin]) expect(await lineOf(who, 'scale-checks')).toMatchObject({ number: 1, reason: expect.stringMatching(/^Last check of Bench /), to: '/scales' })
    expect(await topicsOf(firm.warehouse)).not.toContain('scale-checks')
    await firm.manager.client.patch(`/api/scales/${bench.id}`, { active: false })
    expect(await topicsOf(firm.manager)).not.toContain('scale-checks')
  })

  it('says how far the log had come, and is nobody\'s who is not signed in', async () => {
    const { body: head } = await firm.manager.client.get<LogHead>('/api/log/head')
    expect((await firm.manager.client.get<NowAnswer>('/api/now')).body.seq).toBe(head.seq)
    expect((await fetch(`${server.baseUrl}/api/now`)).status).toBe(401)
  })
})
