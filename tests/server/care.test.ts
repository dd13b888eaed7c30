import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CylinderView, EventsAnswer } from '../../utils/contract/custody'
import type { Member } from '../helpers/firm'
import { cylinderNow, eventOf, openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let firm: Shop
let cylinder: CylinderView
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  cylinder = await registered(firm)
})
afterAll(() => server.stop())

/** How one event was answered: accepted, or refused with a status. */
async function answer(by: Member, kind: string, details: object, more: object = {}): Promise<string | number | undefined> {
  const { body } = await by.client.post<EventsAnswer>('/api/events', { events: [{ ...eventOf(cylinder.id, kind), ...more, details }] })
  const [result] = body.results
  return result?.problem?.status ?? result?.outcome
}

const now = () => cylinderNow(firm.manager.client, cylinder.id)

describe('the care of a cylinder', () => {
  it('is everybody\'s who works with it: to set it apart, look it over, miss it and find it', async () => {
    for (const by of [firm.technician, firm.warehouse]) {
      expect(await answer(by, 'inspected', { result: 'sound' })).toBe('accepted')
      expect(await answer(by, 'missing', { lastSeen: 'on the roof' })).toBe('accepted')
      expect((await now()).lifecycle).toBe('missing')
      expect(await answer(by, 'found', { placeId: firm.shop.id })).toBe('accepted')
      expect(await answer(by, 'quarantined', { reason: 'oil at the valve' })).toBe('accepted')
    }
    expect(await now()).toMatchObject({ lifecycle: 'quarantined', place: { id: firm.shop.id }, capacity: { stopWeightGrams: null } })
  })

  it('is no auditor\'s and no administrator\'s', async () => {
    for (const { client } of [firm.auditor, firm.admin]) {
      expect((await client.post('/api/events', { events: [{ ...eventOf(cylinder.id, 'missing'), details: {} }] })).status).toBe(403)
    }
  })

  it('leaves the release and the end to a manager who has looked at the cylinder as it stands', async () => {
    const { version } = await now()
    for (const by of [firm.technician, firm.warehouse]) {
      for (const kind of ['released', 'retired']) expect(await answer(by, kind, { reason: 'dry' }, { expects: version })).toBe(403)
    }
    expect(await answer(firm.manager, 'released', { reason: 'dry' })).toBe(400)
    expect(await answer(firm.manager, 'released', { reason: 'dry' }, { expects: version - 1 })).toBe(409)
    expect(await answer(firm.manager, 'released', { reason: 'dry' }, { expects: version })).toBe('accepted')
    expect((await now()).lifecycle).toBe('in-service')
    expect(await answer(firm.manager, 'retired', { reason: 'scrapped', proof: { certificate: 'S-114' } }, { expects: version })).toBe(409)
    expect(await answer(firm.manager, 'retired', { reason: 'scrapped', proof: { certificate: 'S-114' } }, { expects: version + 1 })).toBe('accepted')
    expect(await now()).toMatchObject({ lifecycle: 'retired', contents: { refrigerant: 'R-22' } })
  })

  it('takes what is damaged by its closed list alone', async () => {
    expect(await answer(firm.technician, 'inspected', { result: 'damaged', reasons: ['rust'] })).toBe(400)
    expect(await answer(firm.technician, 'inspected', { result: 'damaged', reasons: ['corrosion'] })).toBe('accepted')
    expect((await now()).holds).toContain('damaged')
  })
})
