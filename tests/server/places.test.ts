import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Firm, FirmsAnswer, Place, PlacesAnswer, StandingAnswer } from '../../utils/contract/places'
import type { ProblemDetails } from '../../utils/contract/problem'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

async function place(id: string): Promise<Place | undefined> {
  const { body } = await firm.technician.client.get<PlacesAnswer>('/api/places')
  return body.items.find(one => one.id === id)
}

describe('places', () => {
  it('count the cylinders that stand there now', async () => {
    const van = await made<Place>(firm.admin.client, '/api/places', { name: 'Van 3', kind: 'van', technicianId: firm.technician.id })
    expect(van).toMatchObject({ name: 'Van 3', kind: 'van', technicianName: 'Tina', parentId: null, firmId: null, active: true, cylinders: 0 })
    const before = (await place(firm.shop.id))!.cylinders
    const cylinder = await registered(firm)
    expect((await place(firm.shop.id))!.cylinders).toBe(before + 1)
    await posted(firm.technician.client, [{ ...eventOf(cylinder.id, 'moved'), details: { toPlaceId: van.id, toHolderId: firm.technician.id } }])
    expect((await place(firm.shop.id))!.cylinders).toBe(before)
    expect((await place(van.id))!.cylinders).toBe(1)

    const off = await firm.admin.client.patch(`/api/places/${van.id}`, { active: false })
    expect(off.status).toBe(409)
    await posted(firm.technician.client, [{ ...eventOf(cylinder.id, 'moved'), details: { toPlaceId: firm.shop.id } }])
    expect((await firm.admin.client.patch<Place>(`/api/places/${van.id}`, { active: false })).body.active).toBe(false)
    const { body } = await firm.technician.client.get<PlacesAnswer>('/api/places?active=true')
    expect(body.items.map(one => one.id)).not.toContain(van.id)
  })

  it('are not closed while a place in use is inside them', async () => {
    const { client } = firm.admin
    const yard = await made<Place>(client, '/api/places', { name: 'Far yard', kind: 'shop' })
    const shed = await made<Place>(client, '/api/places', { name: 'Shed', kind: 'rack', parentId: yard.id })
    expect((await client.patch<ProblemDetails>(`/api/places/${yard.id}`, { active: false })).body).toMatchObject({ status: 409, title: 'Another place is inside it' })
    await client.patch(`/api/places/${shed.id}`, { active: false })
    expect((await client.patch<Place>(`/api/places/${yard.id}`, { active: false })).body.active).toBe(false)
  })

  it('say what stands in each of them, by refrigerant and by gross', async () => {
    const rack = await made<Place>(firm.admin.client, '/api/places', { name: 'Rack S', kind: 'rack', parentId: firm.shop.id })
    // 40 lb are 18,144 g, and the empty one weighs its tare of 27.5 lb, 12,474 g.
    const full = await registered(firm)
    const empty = await registered(firm, { contents: 'evacuated' })
    for (const each of [full, empty]) await posted(firm.technician.client, [{ ...eventOf(each.id, 'moved'), details: { toPlaceId: rack.id } }])
    const { body } = await firm.technician.client.get<StandingAnswer>('/api/places/standing')
    expect(body.items.find(({ placeId }) => placeId === rack.id)).toEqual({
      placeId: rack.id, cylinders: 2, withoutWeight: 0, grossGrams: 30_618,
      refrigerants: [{ refrigerant: 'R-22', cylinders: 1 }, { refrigerant: 'none', cylinders: 1 }],
    })
  })

  it('are known to events from the moment they are made', async () => {
    const rack = await made<Place>(firm.admin.client, '/api/places', { name: 'Rack A', kind: 'rack', parentId: firm.shop.id })
    const cylinder = await registered(firm)
    const [moved] = await posted(firm.technician.client, [{ ...eventOf(cylinder.id, 'moved'), details: { toPlaceId: rack.id } }])
    expect(moved!.place).toMatchObject({ id: rack.id, name: 'Rack A' })
    await firm.admin.client.patch(`/api/places/${rack.id}`, { name: 'Rack B' })
    const { body } = await firm.technician.client.get(`/api/cylinders/${cylinder.id}`)
    expect(body).toMatchObject({ place: { name: 'Rack B' } })
  })

  it('are made once where their sender asks twice, and another one of the same id is refused', async () => {
    const body = { id: randomUUID(), name: 'Yard', kind: 'shop' }
    const [first, second] = [await made<Place>(firm.admin.client, '/api/places', body), await made<Place>(firm.admin.client, '/api/places', body)]
    expect(second).toEqual(first)
    expect((await firm.admin.client.post('/api/places', { ...body, name: 'Other yard' })).status).toBe(409)
  })

  it('stand in a place that is known, and never inside themselves', async () => {
    const { client } = firm.admin
    expect((await client.post('/api/places', { name: 'Rack', kind: 'rack', parentId: randomUUID() })).status).toBe(422)
    expect((await client.post('/api/places', { name: 'Van', kind: 'van', technicianId: randomUUID() })).status).toBe(422)
    expect((await client.post('/api/places', { name: 'Rack', kind: 'rack', technicianId: firm.technician.id })).status).toBe(422)
    const rack = await made<Place>(client, '/api/places', { name: 'Rack C', kind: 'rack', parentId: firm.shop.id })
    const circle = await client.patch<ProblemDetails>(`/api/places/${firm.shop.id}`, { parentId: rack.id })
    expect(circle.status).toBe(422)
    expect(circle.body.errors).toEqual([{ path: 'parentId', message: 'a place cannot stand inside itself' }])
    expect((await client.patch<Place>(`/api/places/${rack.id}`, { parentId: null })).body.parentId).toBeNull()
    expect((await client.patch(`/api/places/${randomUUID()}`, { name: 'X' })).status).toBe(404)
  })

  it('stand in no van, no firm and nothing that is closed: a van\'s load is what stands in the van itself', async () => {
    const { client } = firm.admin
    const van = await made<Place>(client, '/api/places', { name: 'Van with a rack', kind: 'van' })
    const closed = await made<Place>(client, '/api/places', { name: 'Old shed', kind: 'rack' })
    await client.patch(`/api/places/${closed.id}`, { active: false })
    const rack = await made<Place>(client, '/api/places', { name: 'Rack D', kind: 'rack', parentId: firm.shop.id })
    for (const parentId of [van.id, closed.id, firm.reclaimer.placeId]) {
      const errors = [{ path: 'parentId', message: 'must be in use, and no van and no firm' }]
      const answers = [
        await client.post<ProblemDetails>('/api/places', { name: 'Rack E', kind: 'rack', parentId }), await client.patch<ProblemDetails>(`/api/places/${rack.id}`, { parentId }),
      ]
      expect(answers.map(({ status, body }) => [status, body.errors])).toEqual([[422, errors], [422, errors]])
    }
  })

  it('are made by an admin and read by everyone', async () => {
    for (const person of [firm.warehouse, firm.technician, firm.manager, firm.auditor]) {
      expect((await person.client.post('/api/places', { name: 'Den', kind: 'shop' })).status).toBe(403)
      expect((await person.client.patch(`/api/places/${firm.shop.id}`, { name: 'Den' })).status).toBe(403)
      expect((await person.client.get('/api/places')).status).toBe(200)
    }
  })

  it.each([
    [{ name: '', kind: 'shop' }], [{ name: 'A\u202Eb', kind: 'shop' }], [{ name: 'A', kind: 'firm' }], [{ name: 'A', kind: 'shop', colour: 'red' }],
  ])('refuse %j', async (body) => {
    expect((await firm.admin.client.post('/api/places', body)).status).toBe(400)
  })
})

describe('firms', () => {
  it('have one place of their own, which follows their name', async () => {
    const supplier = await made<Firm>(firm.admin.client, '/api/firms', { name: 'Quillfen Gas Supply', kind: 'supplier', telephone: '555-0170' })
    expect(await place(supplier.placeId)).toMatchObject({ name: 'Quillfen Gas Supply', kind: 'firm', firmId: supplier.id, cylinders: 0 })
    const changed = await firm.admin.client.patch<Firm>(`/api/firms/${supplier.id}`, { name: 'Bay Gas Supply', telephone: null })
    expect(changed.body).toMatchObject({ id: supplier.id, name: 'Bay Gas Supply', telephone: null, placeId: supplier.placeId })
    expect((await place(supplier.placeId))!.name).toBe('Bay Gas Supply')
    expect((await firm.admin.client.patch(`/api/places/${supplier.placeId}`, { name: 'Den' })).status).toBe(409)
    expect((await firm.admin.client.patch<Firm>(`/api/firms/${supplier.id}`, { active: false })).body.active).toBe(false)
    expect((await place(supplier.placeId))!.active).toBe(false)
  })

  it('are made once with one place where their sender asks twice', async () => {
    const body = { id: randomUUID(), name: 'Twice Reclaim', kind: 'reclaimer' }
    const answers = await Promise.all([1, 2, 3].map(() => made<Firm>(firm.admin.client, '/api/firms', body)))
    expect(new Set(answers.map(one => one.placeId)).size).toBe(1)
    const { body: places } = await firm.auditor.client.get<PlacesAnswer>('/api/places')
    expect(places.items.filter(one => one.firmId === body.id)).toHaveLength(1)
  })

  it('have a name of their own, whatever its capitals and spaces, also against one that is turned off', async () => {
    const { client } = firm.admin
    const taken = await client.post<ProblemDetails>('/api/firms', { name: 'tarnvale  RECLAIM', kind: 'supplier' })
    expect([taken.status, taken.body.type, taken.body.errors?.map(({ path }) => path)]).toEqual([409, 'name-taken', ['name']])
    expect(taken.body.detail).toContain('Tarnvale Reclaim is there already')
    const other = await made<Firm>(client, '/api/firms', { name: 'Marl Carriers', kind: 'carrier' })
    expect((await client.patch(`/api/firms/${other.id}`, { name: 'Tarnvale Reclaim' })).status).toBe(409)
    expect((await client.patch<Firm>(`/api/firms/${other.id}`, { name: 'MARL Carriers' })).body.name).toBe('MARL Carriers')
    await client.patch(`/api/firms/${other.id}`, { active: false })
    expect((await client.post<ProblemDetails>('/api/firms', { name: 'Marl Carriers', kind: 'carrier' })).body.detail).toContain('turned off')
    // Two at once: one of them is first.
    const both = await Promise.all([1, 2].map(() => client.post('/api/firms', { name: 'Race Supply', kind: 'supplier' })))
    expect(both.map(({ status }) => status).sort()).toEqual([201, 409])
  })

  it('have a RIN only where they requalify cylinders', async () => {
    expect(firm.requalifier.rin).toBe('A123')
    expect((await firm.admin.client.post('/api/firms', { name: 'R', kind: 'reclaimer', rin: 'A123' })).status).toBe(422)
    expect((await firm.admin.client.patch(`/api/firms/${firm.reclaimer.id}`, { rin: 'A123' })).status).toBe(422)
    expect((await firm.admin.client.post('/api/firms', { name: 'R', kind: 'requalifier', rin: 'A12' })).status).toBe(400)
  })

  it('are listed by kind, made by an admin alone', async () => {
    const { body } = await firm.technician.client.get<FirmsAnswer>('/api/firms?kind=requalifier')
    expect(body.items.map(one => one.name)).toEqual(['Ostwick Cylinder Tests'])
    for (const person of [firm.warehouse, firm.technician, firm.manager, firm.auditor]) {
      expect((await person.client.post('/api/firms', { name: 'R', kind: 'customer' })).status).toBe(403)
      expect((await person.client.patch(`/api/firms/${firm.reclaimer.id}`, { name: 'R' })).status).toBe(403)
    }
  })
})
