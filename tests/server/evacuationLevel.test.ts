import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { EvacuationLevelAnswer } from '../../utils/contract/recovery'
import { TestClient } from '../helpers/client'
import { setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let admin: Member
beforeAll(async () => {
  server = await startServer()
  admin = await setUpFirm(server)
})
afterAll(() => server.stop())

function level(query: Record<string, string>) {
  return admin.client.get<EvacuationLevelAnswer & ProblemDetails>(`/api/evacuation-level?${new URLSearchParams(query)}`)
}

describe('the level of evacuation', () => {
  it('is 15 inHg for 200 lb of R-134a and a machine of 15 November 1993, 4 for one of the day before', async () => {
    const asked = { refrigerant: 'R-134a', charge: '200lb', circumstances: 'major' }
    const { status, body } = await level({ ...asked, machineMade: '1993-11-15' })
    expect(status).toBe(200)
    expect(body).toMatchObject({
      refrigerant: 'R-134a', level: { unit: 'inHg-vacuum', value: 15 }, pressureClass: 'medium', assumed: [], judged: null,
      source: '40 CFR 82.156(a), Table 1', onGauges: { inHg: 15, mmHgAbsolute: 378, microns: 378_000 },
    })
    expect((await level({ ...asked, machineMade: '1993-11-14' })).body.level).toEqual({ unit: 'inHg-vacuum', value: 4 })
    expect((await level({ ...asked, charge: '199.9lb', machineMade: '2004' })).body.level).toEqual({ unit: 'inHg-vacuum', value: 10 })
  })

  it('is asked for by a designation in any case', async () => {
    expect((await level({ refrigerant: 'r-134A', charge: '200lb', machineMade: '2004' })).body).toMatchObject({ refrigerant: 'R-134a', level: { unit: 'inHg-vacuum', value: 15 } })
  })

  it('is the deepest of all where nothing is said, and says what was taken for it', async () => {
    const { body } = await level({})
    expect(body).toMatchObject({ refrigerant: null, level: { unit: 'mmHg-absolute', value: 25 } })
    expect(body.assumed).toHaveLength(2)
    expect((await level({ refrigerant: 'R-134a', machineMade: '1993' })).body.assumed).toHaveLength(3)
  })

  it('is judged by the gauge that was read, with the minutes that it held', async () => {
    const asked = { refrigerant: 'R-134a', charge: '12lb', machineMade: '2004' }
    expect((await level({ ...asked, inHg: '10', heldMinutes: '5' })).body.judged).toMatchObject({ verdict: 'reached', heldMinutes: 5 })
    expect((await level({ ...asked, inHg: '0' })).body.judged).toMatchObject({ verdict: 'not-reached', heldMinutes: null })
    // In air of 24.9 inHg a gauge shows 5 where 19.9 inHg are left.
    expect((await level({ ...asked, inHg: '5', barometerInHg: '24.9' })).body).toMatchObject({ judged: { verdict: 'reached' }, onGauges: { inHg: 5 } })
    expect((await level({ ...asked, heldMinutes: '5' })).body.judged).toMatchObject({ verdict: 'unknown' })
  })

  it('of a small appliance is judged by what came out', async () => {
    const asked = { appliance: 'small', refrigerant: 'R-134a', charge: '1kg', machineMade: '2004', compressorRuns: 'true' }
    expect((await level({ ...asked, recovered: '0.9kg' })).body).toMatchObject({ level: { value: 90 }, alternative: { value: 4 }, onGauges: null, judged: { verdict: 'reached' } })
    expect((await level({ ...asked, recovered: '0.89kg' })).body.judged).toMatchObject({ verdict: 'not-reached' })
    expect((await level({ ...asked, charge: '2.0lb', recovered: '1.8lb' })).body.judged).toMatchObject({ verdict: 'reached' })
  })
})

describe('a question that cannot be answered', () => {
  it.each([
    ['a refrigerant that nobody sells', { refrigerant: 'R-9999' }, 'refrigerant'],
    ['two gauges', { inHg: '10', microns: '500' }, 'microns'],
    ['a barometer alone', { barometerInHg: '29.9' }, 'barometerInHg'],
    ['what came out of an unknown charge', { appliance: 'small', recovered: '0.9kg' }, 'charge'],
    ['a share of nothing', { appliance: 'small', charge: '0kg', recovered: '0kg' }, 'charge'],
  ])('is refused and names the field: %s', async (_, query, path) => {
    const { status, body } = await level(query as Record<string, string>)
    expect(status).toBe(422)
    expect(body.errors?.map(error => error.path)).toEqual([path])
  })

  it.each<[string, Record<string, string>]>([
    ['machineMade', { machineMade: '1993-13' }], ['machineMade', { machineMade: '1993-02-31' }], ['charge', { charge: '12' }], ['inHg', { inHg: '-1' }], ['barometerInHg', { inHg: '1', barometerInHg: '14' }],
    ['appliance', { appliance: 'large' }], ['level', { level: '10' }],
  ])('is malformed by its field: %s', async (path, query) => {
    const { status, body } = await level(query)
    expect(status).toBe(400)
    expect(body.errors?.map(error => error.path)).toEqual([path])
  })

  it('is asked by people who are signed in', async () => {
    expect((await new TestClient(server.baseUrl).get('/api/evacuation-level')).status).toBe(401)
  })
})
