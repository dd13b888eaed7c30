import { randomUUID } from 'node:crypto'
import { createClient } from '@libsql/client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { PolicyAnswer } from '../../utils/contract/policy'
import type { ScaleLine, ScalesAnswer } from '../../utils/contract/scales'
import { cylinderNow, eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

const ROUGH = { accuracy: { unit: 'lb', value: 0.5 }, accuracyPercent: 0 }

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

const errorsOf = ({ body }: { body: ProblemDetails }) => body.errors?.map(({ path }) => path)

describe('scales', () => {
  it('are read by everybody signed in, made and changed by a manager or an admin', async () => {
    expect((await firm.technician.client.get<ScalesAnswer>('/api/scales')).status).toBe(200)
    for (const person of [firm.warehouse, firm.technician, firm.auditor]) {
      expect((await person.client.post('/api/scales', { name: 'Mine', ...ROUGH })).status).toBe(403)
      expect((await person.client.patch(`/api/scales/${randomUUID()}`, { active: false })).status).toBe(403)
    }
    const dock = await made<ScaleLine>(firm.manager.client, '/api/scales', { name: 'Dock', accuracy: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.25, lastCheckOn: '2025-03-14' })
    expect(dock).toMatchObject({ name: 'Dock', accuracy: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.25, lastCheckOn: '2025-03-14', active: true })
    const changed = await firm.admin.client.patch<ScaleLine>(`/api/scales/${dock.id}`, { name: 'Dock floor', lastCheckOn: null, active: false })
    expect(changed.body).toEqual({ ...dock, name: 'Dock floor', lastCheckOn: null, active: false })
    expect((await firm.auditor.client.get<ScalesAnswer>('/api/scales?active=true')).body.items.map(({ id }) => id)).not.toContain(dock.id)
    // Half an ounce is 14.2 g, and a scale is taken for no better than it is.
    const { body } = await firm.technician.client.get<PolicyAnswer>('/api/policy')
    expect(body.scales.find(({ id }) => id === dock.id)).toMatchObject({ accuracyGrams: 15, accuracyPercent: 0.25, active: false })
  })

  it('are made once where their sender asks twice', async () => {
    const body = { id: randomUUID(), name: 'Twice', ...ROUGH }
    const answers = await Promise.all([1, 2, 3].map(() => made<ScaleLine>(firm.manager.client, '/api/scales', body)))
    expect(new Set(answers.map(({ id }) => id))).toEqual(new Set([body.id]))
    expect((await firm.manager.client.post('/api/scales', { ...body, name: 'Another' })).status).toBe(409)
  })

  it('have a name of their own, also against one that is turned off', async () => {
    const bay = await made<ScaleLine>(firm.manager.client, '/api/scales', { name: 'Bay scale', ...ROUGH })
    const again = await firm.manager.client.post<ProblemDetails>('/api/scales', { name: ' BAY  scale', ...ROUGH })
    expect([again.status, again.body.type, errorsOf(again)]).toEqual([409, 'name-taken', ['name']])
    await firm.manager.client.patch(`/api/scales/${bay.id}`, { active: false })
    expect((await firm.manager.client.post<ProblemDetails>('/api/scales', { name: 'Bay scale', ...ROUGH })).body.detail).toContain('turned off')
    expect((await firm.manager.client.patch(`/api/scales/${bay.id}`, { name: 'BAY SCALE' })).status).toBe(200)
  })

  it.each([
    [{ name: 'X', accuracy: { unit: 'g', value: 0 }, accuracyPercent: 0 }, 400],
    [{ name: 'X', accuracy: { unit: 'st', value: 1 }, accuracyPercent: 0 }, 400],
    [{ name: 'X', accuracy: { unit: 'g', value: -1 }, accuracyPercent: 0 }, 400],
    [{ name: 'X', ...ROUGH, accuracyPercent: 0.001 }, 400],
    [{ name: 'X', ...ROUGH, lastCheckOn: '2025-02-30' }, 400],
    [{ name: 'X', ...ROUGH, lastCheckOn: '2999-01-01' }, 422],
    [{ name: '', ...ROUGH }, 400],
  ])('refuse %j', async (body, status) => {
    expect((await firm.manager.client.post('/api/scales', body)).status).toBe(status)
  })
})

describe('what was weighed on a scale', () => {
  it('is as good as the scale, and stays so when the scale is renamed and turned off', async () => {
    const rough = await made<ScaleLine>(firm.manager.client, '/api/scales', { name: 'Old dial', ...ROUGH })
    const cylinder = await registered(firm)
    await posted(firm.technician.client, [{ ...eventOf(cylinder.id, 'weighed'), details: { gross: lb(40), scaleId: rough.id } }])
    // Half a pound is 226.8 g; without a scale half a percent of 40 lb would be 90.7 g.
    expect((await cylinderNow(firm.technician.client, cylinder.id)).contents.uncertaintyGrams).toBe(227)

    const other = await firm.manager.client.patch(`/api/scales/${rough.id}`, { accuracyPercent: 5 })
    expect(other.status).toBe(400)
    expect((await firm.manager.client.patch(`/api/scales/${rough.id}`, { name: 'Dial, retired', active: false })).status).toBe(200)
    expect((await cylinderNow(firm.technician.client, cylinder.id)).contents.uncertaintyGrams).toBe(227)

    await posted(firm.technician.client, [{ ...eventOf(cylinder.id, 'weighed'), details: { gross: lb(40) } }])
    expect((await cylinderNow(firm.technician.client, cylinder.id)).contents.uncertaintyGrams).toBe(91)
  })

  it('keeps its scale in the database, past every route', async () => {
    const kept = await made<ScaleLine>(firm.manager.client, '/api/scales', { name: 'Kept', ...ROUGH })
    const database = createClient({ url: `file:${server.databaseFile}`, timeout: 5000 })
    for (const sql of ['update scales set accuracy_grams = 1 where id = ?', 'update scales set accuracy_basis_points = 1 where id = ?', 'delete from scales where id = ?']) {
      await expect(database.execute({ sql, args: [kept.id] })).rejects.toThrow(/a scale/)
    }
    await database.execute({ sql: 'insert or replace into scales (id, name, accuracy_grams, accuracy_basis_points) values (?, ?, 1, 1)', args: [kept.id, 'Kept'] })
    const { rows } = await database.execute({ sql: 'select accuracy_grams from scales where id = ?', args: [kept.id] })
    database.close()
    expect(rows[0]?.[0]).toBe(227)
  })
})
