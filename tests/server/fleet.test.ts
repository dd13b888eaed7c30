import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { FleetAnswer, FleetSummary } from '../../utils/contract/custody'
import { FIRST_LAYOUT, type FleetLayout } from '../../utils/contract/fleetLayout'
import { MOST_VIEWS, type FleetView, type FleetViewsAnswer } from '../../utils/contract/fleetViews'
import type { ProblemDetails } from '../../utils/contract/problem'
import { TestClient } from '../helpers/client'
import { made, openShop, registered, type Shop } from '../helpers/fleet'
import { fillFleet } from '../helpers/fleetRows'
import { startServer, type TestServer } from '../helpers/server'

const MANY = 1_300

let server: TestServer
let shop: Shop
beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  await registered(shop, { stamp: { serial: '=2"x",4' } })
  await fillFleet(server.databaseFile, MANY, { places: [shop.shop.id], holders: [shop.technician.id], owner: shop.reclaimer.id })
})
afterAll(() => server?.stop())

describe('the list of the fleet', () => {
  it('is for whoever is signed in, and for nobody else', async () => {
    for (const path of ['/api/cylinders', '/api/fleet/layout', '/api/fleet/views']) {
      expect((await new TestClient(server.baseUrl).get(path)).status, path).toBe(401)
      for (const member of [shop.technician, shop.auditor, shop.admin]) expect((await member.client.get(path)).status, path).toBe(200)
    }
  })

  it.each(['colour=red', 'sort=colour', 'order=up', 'limit=0', 'limit=201', 'dueBefore=2027-13', 'place=van', 'condition=new', 'cursor=abc', 'q=a&q=b', 'columns=code', 'unit=stone', 'asOf=2026-01-01'])(
    'refuses %s', async (query) => {
      expect((await shop.manager.client.get(`/api/cylinders?${query}`)).status).toBe(400)
    })

  it('says how many there are, on each page', async () => {
    const { client } = shop.manager
    const first = (await client.get<FleetAnswer>('/api/cylinders?limit=100&sort=serial')).body
    const second = (await client.get<FleetAnswer>(`/api/cylinders?limit=100&sort=serial&cursor=${first.nextCursor}`)).body
    expect([first.items.length, first.total, second.items.length, second.total]).toEqual([100, MANY + 1, 100, MANY + 1])
    expect(new Set([...first.items, ...second.items].map(row => row.id)).size).toBe(200)
  })

  it('counts a cylinder at once when it comes', async () => {
    const total = async () => (await shop.manager.client.get<FleetAnswer>('/api/cylinders?refrigerant=R-22&limit=1')).body.total
    const before = await total()
    await registered(shop)
    expect(await total()).toBe(before + 1)
  })

  it('counts beside each refrigerant what choosing it then shows, those away and ended among them', async () => {
    const { client } = shop.manager
    const { body: { refrigerants } } = await client.get<FleetSummary>('/api/fleet/summary')
    for (const { refrigerant, count } of refrigerants) {
      expect((await client.get<FleetAnswer>(`/api/cylinders?refrigerant=${refrigerant}&limit=1`)).body.total, refrigerant).toBe(count)
    }
    expect((await client.get<FleetAnswer>('/api/cylinders?lifecycle=at-reclaim&refrigerant=R-22&limit=1')).body.total).toBeGreaterThan(0)
  })

  it('finds a serial by its characters, however it is cut apart on the collar and in the question', async () => {
    await registered(shop, { stamp: { serial: 'QX-7 1044' } })
    await registered(shop, { stamp: { serial: 'QX81099' } })
    const serials = async (q: string) => (await shop.auditor.client.get<FleetAnswer>(`/api/cylinders?q=${encodeURIComponent(q)}`)).body.items.map(({ serial }) => serial)
    for (const asked of ['QX-7 1044', 'qx71044', 'QX 7-10 44', '71044']) expect(await serials(asked), asked).toEqual(['QX-7 1044'])
    expect(await serials('QX8-1099')).toEqual(['QX81099'])
    expect(await serials('QX-9')).toEqual([])
  })
})

describe('the fleet as CSV', () => {
  const csv = (query: string) => shop.auditor.client.get<string>(`/api/cylinders?${query}`, { accept: 'text/csv' })

  it('holds the whole list, whatever its length, in the columns and the unit asked for', async () => {
    const { status, headers, body } = await csv('columns=code,verdict,serial,net&unit=kg&sort=serial&limit=10')
    expect(status).toBe(200)
    expect(headers.get('content-type')).toMatch(/^text\/csv/)
    expect(headers.get('vary')).toMatch(/accept/i)
    const lines = body.split('\r\n')
    expect(lines[0]).toBe('Code,Verdict,Serial,"Net, kg","Fill limit, kg"')
    expect(lines.at(-1)).toBe('')
    const { total } = (await shop.auditor.client.get<FleetAnswer>('/api/cylinders?limit=1')).body
    expect(lines.length).toBe(total + 2)
    expect(lines.find(line => line.includes('K000007'))).toBeDefined()
  })

  it('quotes what RFC 4180 asks to, and gives no spreadsheet a sum to reckon', async () => {
    const { body } = await csv('columns=code,verdict,serial&sort=serial&q=%3D2')
    expect(body.split('\r\n')[1]).toMatch(/,"'=2""x"",4"$/)
  })

  it('keeps to the filters', async () => {
    const { total } = (await shop.auditor.client.get<FleetAnswer>('/api/cylinders?limit=1&refrigerant=R-32')).body
    const { body } = await csv('columns=code,verdict,refrigerant&refrigerant=R-32')
    const lines = body.trimEnd().split('\r\n').slice(1)
    expect(lines).toHaveLength(total)
    expect(lines.every(line => line.endsWith(',R-32'))).toBe(true)
  })
})

describe('the table of the fleet', () => {
  it('is kept for each person apart', async () => {
    const layout: FleetLayout = { columns: ['code', 'verdict', 'stop', 'room'], density: 'comfortable' }
    expect((await shop.manager.client.put<FleetLayout>('/api/fleet/layout', layout)).body).toEqual(layout)
    expect((await shop.manager.client.get<FleetLayout>('/api/fleet/layout')).body).toEqual(layout)
    expect((await shop.auditor.client.get<FleetLayout>('/api/fleet/layout')).body).toEqual(FIRST_LAYOUT)
    await shop.manager.client.put('/api/fleet/layout', { ...layout, density: 'compact' })
    expect((await shop.manager.client.get<FleetLayout>('/api/fleet/layout')).body.density).toBe('compact')
  })

  it('is refused without code and verdict', async () => {
    for (const columns of [['code'], ['room', 'code', 'verdict'], ['code', 'verdict', 'colour']]) {
      expect((await shop.manager.client.put('/api/fleet/layout', { columns, density: 'compact' })).status).toBe(400)
    }
  })
})

describe('a named view', () => {
  const views = async (member = shop.warehouse) => (await member.client.get<FleetViewsAnswer>('/api/fleet/views')).body.items
  const saved = (name: string, query = {}) => made<FleetView>(shop.warehouse.client, '/api/fleet/views', { name, query })

  it('keeps filters and order, and nothing else of the address', async () => {
    const view = await saved('R-22 in stock', { refrigerant: 'R-22', sort: 'net', order: 'desc', cursor: 'abc', colour: 'red' })
    expect(view.query).toEqual({ refrigerant: 'R-22', sort: 'net', order: 'desc' })
    expect(await views()).toContainEqual(view)
    expect(await views(shop.manager)).toEqual([])
  })

  it('is renamed and removed by its person alone', async () => {
    const { id } = await saved('Vans')
    expect((await shop.manager.client.patch(`/api/fleet/views/${id}`, { name: 'Mine' })).status).toBe(404)
    expect((await shop.manager.client.delete(`/api/fleet/views/${id}`)).status).toBe(404)
    expect((await shop.warehouse.client.patch<FleetView>(`/api/fleet/views/${id}`, { name: 'All vans' })).body.name).toBe('All vans')
    expect((await views()).map(view => view.name)).toContain('All vans')
    expect((await shop.warehouse.client.delete(`/api/fleet/views/${id}`)).status).toBe(204)
    expect((await views()).map(view => view.id)).not.toContain(id)
    expect((await shop.warehouse.client.delete(`/api/fleet/views/${id}`)).status).toBe(404)
  })

  it('has a name that no other of the same person has, in any case', async () => {
    const { id } = await saved('Late ones')
    const again = await shop.warehouse.client.post<ProblemDetails>('/api/fleet/views', { name: 'LATE ones', query: {} })
    expect([again.status, again.body.type, again.body.errors?.[0]?.path]).toEqual([409, 'name-taken', 'name'])
    expect((await shop.warehouse.client.patch(`/api/fleet/views/${id}`, { name: 'Late Ones' })).status).toBe(200)
    expect((await shop.warehouse.client.post('/api/fleet/views', { name: ' ', query: {} })).status).toBe(400)
    await made(shop.manager.client, '/api/fleet/views', { name: 'Late ones', query: {} })
  })

  it('is one of a number that stays small', async () => {
    const { client } = shop.auditor
    for (let number = 1; number <= MOST_VIEWS; number++) await made(client, '/api/fleet/views', { name: `View ${number}`, query: {} })
    expect((await client.post('/api/fleet/views', { name: 'One more', query: {} })).status).toBe(422)
  })
})
