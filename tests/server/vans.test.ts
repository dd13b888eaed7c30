import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Place } from '../../utils/contract/places'
import type { RankingAnswer } from '../../utils/contract/ranking'
import type { VanAnswer, VansAnswer } from '../../utils/contract/vans'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb, stampOf } from '../helpers/stamps'

let server: TestServer
let firm: Shop
let van: Place
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
  van = await made<Place>(firm.admin.client, '/api/places', { name: 'Van 7', kind: 'van', technicianId: firm.technician.id })
})
afterAll(() => server.stop())

async function aboard(changes: Parameters<typeof registered>[1] = {}): Promise<CylinderView> {
  const { id } = await registered(firm, changes)
  const [view] = await posted(firm.technician.client, [{ ...eventOf(id, 'moved'), details: { toPlaceId: van.id, toHolderId: firm.technician.id } }])
  return view!
}

const shown = async (id = van.id) => (await firm.manager.client.get<VanAnswer>(`/api/vans/${id}`)).body

describe('a van', () => {
  it('holds what stands in it, and tells it from what its technician holds elsewhere', async () => {
    const inVan = await aboard()
    const atSite = await registered(firm)
    await posted(firm.technician.client, [{ ...eventOf(atSite.id, 'moved'), details: { toPlaceId: firm.shop.id, toHolderId: firm.technician.id } }])
    const { aboard: rows, heldElsewhere } = await shown()
    expect(rows.map(({ id }) => id)).toEqual([inVan.id])
    expect(heldElsewhere.map(({ id }) => id)).toEqual([atSite.id])
  })

  it('is a van: no other place answers as one', async () => {
    expect((await firm.manager.client.get(`/api/vans/${firm.shop.id}`)).status).toBe(404)
    expect((await firm.manager.client.post(`/api/vans/${firm.shop.id}/check-ins`, { id: randomUUID(), found: [], missing: [] })).status).toBe(404)
  })

  it('carries what was last said, and who has said so', async () => {
    expect((await shown()).materials).toBeNull()
    const first = { id: randomUUID(), gross: lb(80), note: 'torch set' }
    await made(firm.technician.client, `/api/vans/${van.id}/materials`, first)
    await made(firm.technician.client, `/api/vans/${van.id}/materials`, { id: randomUUID(), gross: lb(0) })
    // The first one sent once more changes nothing.
    await made(firm.technician.client, `/api/vans/${van.id}/materials`, first)
    expect((await shown()).materials).toMatchObject({ gross: { unit: 'lb', value: 0 }, grams: 0, note: '', saidBy: { name: 'Tina' } })
    expect((await firm.auditor.client.post(`/api/vans/${van.id}/materials`, { id: randomUUID(), gross: lb(10) })).status).toBe(403)
    expect((await firm.technician.client.post(`/api/vans/${van.id}/materials`, { id: randomUUID(), gross: lb(-1) })).status).toBe(400)
  })
})

describe('what is sent about a van under an id that is taken', () => {
  it('is refused where it says something else or is of another van, and kept once where it is the same', async () => {
    const other = await made<Place>(firm.admin.client, '/api/places', { name: 'Van 8', kind: 'van' })
    const cylinder = await registered(firm)
    const sent: [string, object, object][] = [
      ['check-ins', { id: randomUUID(), found: [], missing: [] }, { found: [cylinder.id] }],
      ['materials', { id: randomUUID(), gross: lb(80), note: '' }, { gross: lb(81) }],
    ]
    for (const [what, body, otherwise] of sent) {
      const answered = async (place: Place, change: object = {}) => (await firm.technician.client.post(`/api/vans/${place.id}/${what}`, { ...body, ...change })).status
      expect([await answered(other), await answered(other), await answered(other, otherwise), await answered(van)]).toEqual([201, 201, 409, 409])
    }
    expect((await shown(other.id)).materials).toMatchObject({ gross: { unit: 'lb', value: 80 } })
  })
})

describe('a van with more cylinders than anybody would put there', () => {
  it('is shown, summed and checked in with all of them', async () => {
    const crowded = await made<Place>(firm.admin.client, '/api/places', { name: 'Van 9', kind: 'van' })
    const ids = Array.from({ length: 201 }, () => randomUUID())
    const registration = (id: string) => ({
      ...eventOf(id, 'registered'), placeId: crowded.id,
      details: { stamp: stampOf({ serial: `C${id.slice(0, 8)}` }), marks: [{ month: '2025-06' }], ownership: 'own', contents: 'evacuated' },
    })
    for (const some of [ids.slice(0, 150), ids.slice(150)]) await posted(firm.warehouse.client, some.map(registration))
    expect((await shown(crowded.id)).aboard).toHaveLength(201)
    const { body: all } = await firm.manager.client.get<VansAnswer>('/api/vans')
    expect(all.items.find(line => line.van.id === crowded.id)!.aboard).toHaveLength(201)
    await made(firm.warehouse.client, `/api/vans/${crowded.id}/check-ins`, { id: randomUUID(), found: [], missing: ids })
    expect((await shown(crowded.id)).toLookFor).toHaveLength(201)
  })
})

describe('a check-in', () => {
  it('names what it has missed until somebody has seen it', async () => {
    const [there, lost] = [await aboard(), await aboard()]
    const body = { id: randomUUID(), found: [there.id], missing: [lost.id] }
    await made<VanAnswer>(firm.warehouse.client, `/api/vans/${van.id}/check-ins`, body)
    const { toLookFor, lastCheckIn } = await shown()
    expect(toLookFor).toMatchObject([{ cylinder: { id: lost.id, holder: { name: 'Tina' }, place: { name: 'Van 7' } }, checkedBy: { name: 'Wes' } }])
    expect(lastCheckIn).toMatchObject({ checkedBy: { name: 'Wes' } })
    const { body: all } = await firm.manager.client.get<VansAnswer>('/api/vans')
    expect(all.items.find(line => line.van.id === van.id)!.toLookFor).toHaveLength(1)

    await posted(firm.technician.client, [{ ...eventOf(lost.id, 'weighed'), details: { gross: lb(40) } }])
    expect((await shown()).toLookFor).toEqual([])
  })

  it('has no cylinder both found and missing, and is kept by those who record', async () => {
    const id = randomUUID()
    expect((await firm.warehouse.client.post(`/api/vans/${van.id}/check-ins`, { id, found: [id], missing: [id] })).status).toBe(400)
    expect((await firm.auditor.client.post(`/api/vans/${van.id}/check-ins`, { id, found: [], missing: [] })).status).toBe(403)
  })
})

describe('which cylinder', () => {
  const ask = async (query: string) => firm.technician.client.get<RankingAnswer>(`/api/cylinder-ranking?${query}`)

  it('is asked from the own van: the one aboard first, then the shop, and refusals by their reason', async () => {
    const holds = await aboard({ contents: { refrigerant: 'R-32', condition: 'clean' }, gross: lb(36) })
    const inShop = await registered(firm, { contents: 'evacuated' })
    const { body } = await ask('refrigerant=R-32&amount=5lb')
    expect(body.van).toEqual({ id: van.id, name: 'Van 7' })
    expect(body.amountGrams).toBe(2_268)
    expect(body.items[0]).toMatchObject({ id: holds.id, reach: 'van', fit: 'whole', reasons: ['holds R-32'] })
    expect(body.items.find(({ id }) => id === inShop.id)).toMatchObject({ reach: 'shop', fit: 'whole', reasons: ['empty, evacuated'] })
    expect(body.items.filter(({ fit }) => fit === 'refused').map(({ reasons }) => reasons[0])).toContain('holds R-22')
  })

  it('is also asked of a second van of the same technician', async () => {
    const second = await made<Place>(firm.admin.client, '/api/places', { name: 'Van 7b', kind: 'van', technicianId: firm.technician.id })
    const { id } = await registered(firm, { contents: 'evacuated' })
    await posted(firm.warehouse.client, [{ ...eventOf(id, 'moved'), details: { toPlaceId: second.id, toHolderId: firm.warehouse.id } }])
    const { body } = await ask('refrigerant=R-32&amount=5lb')
    expect(body.van).toMatchObject({ name: 'Van 7' })
    expect(body.items.find(line => line.id === id)).toMatchObject({ reach: 'held', place: { name: 'Van 7b' } })
  })

  it('is none in a shop that waits for a shipment', async () => {
    const waiting = await registered(firm, { contents: { refrigerant: 'R-32', condition: 'clean' }, stamp: { flammableMarked: true }, gross: lb(36) })
    const ranked = async () => (await ask('refrigerant=R-32&amount=5lb')).body.items.some(({ id }) => id === waiting.id)
    expect(await ranked()).toBe(true)
    await made(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: [waiting.id] })
    expect(await ranked()).toBe(false)
  })

  it('is refused an amount of nothing, an unknown refrigerant and a van that is none', async () => {
    expect((await ask('refrigerant=R-32&amount=0lb')).status).toBe(400)
    expect((await ask('refrigerant=R-9999&amount=5lb')).status).toBe(404)
    expect((await ask(`refrigerant=R-32&amount=5lb&van=${firm.shop.id}`)).status).toBe(404)
  })
})
