import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { PressureCheckAnswer } from '../../utils/contract/pressureCheck'
import type { ProblemDetails } from '../../utils/contract/problem'
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

// R-410A at 80 F: 236.5 psig on a printed pressure-temperature page, 1731.9 kPa.
const PRINTED = { refrigerant: 'R-410A', pressureKPa: '1731.9', temperatureC: '26.667' }

function check(query: Record<string, string> = {}) {
  return admin.client.get<PressureCheckAnswer & ProblemDetails>(`/api/pressure-check?${new URLSearchParams({ ...PRINTED, ...query })}`)
}

describe('a pressure check without a cylinder', () => {
  it('agrees with the printed pressure, and says how it judged', async () => {
    const { status, body } = await check()
    expect(status).toBe(200)
    expect(body).toMatchObject({ refrigerant: 'R-410A', verdict: 'agrees', absoluteKPa: 1731.9, relativeErrorPressure: 0.01, accuracyGroup: 'B', doubt: null })
    expect(Math.abs(body.bubbleKPa - 1731.9)).toBeLessThan(0.7)
    expect(body.dewKPa).toBeLessThan(body.bubbleKPa)
    expect(body.excessKPa).toBeCloseTo(1731.9 - body.bubbleKPa, 6)
    // A gauge to 1 psi and a thermometer to 2 F where nothing is said.
    expect(body.toleranceKPa).toBeCloseTo(6.895 + body.slopeKPaPerC * 10 / 9, 2)
    expect(body.source).not.toBe('')
  })

  it('is in excess 20 psi above and below 20 psi beneath, and never names a gas', async () => {
    // 20 psi = 137.9 kPa.
    const above = await check({ pressureKPa: '1869.8' })
    expect(above.body.verdict).toBe('excess')
    expect(JSON.stringify(above.body)).not.toMatch(/\bair\b|nitrogen/i)
    expect((await check({ pressureKPa: '1594' })).body.verdict).toBe('below')
  })

  it('takes the instruments and the air as they are said to be', async () => {
    // 1731.9 + 40 = 1771.9: more than good instruments and 1 % of the figures may be off.
    const good = { pressureKPa: '1771.9', gaugeErrorKPa: '1', thermometerErrorC: '0.1' }
    expect((await check(good)).body.verdict).toBe('excess')
    expect((await check({ ...good, gaugeErrorKPa: '40' })).body.verdict).toBe('agrees')
    // At 5,000 ft 84.3 kPa: 17 kPa less stand in the cylinder.
    expect((await check({ ...good, barometerKPa: '84.3' })).body).toMatchObject({ verdict: 'agrees', absoluteKPa: 1771.9 - 101.325 + 84.3 })
  })

  it('finds the refrigerant in any case, and says that it has none of another name', async () => {
    expect((await check({ refrigerant: 'r-410a' })).body.refrigerant).toBe('R-410A')
    const unknown = await check({ refrigerant: 'R-9999' })
    expect(unknown.status).toBe(404)
    expect(unknown.body.title).toBe('No such refrigerant')
  })

  it('is not possible where there is no liquid or no figure, and says why', async () => {
    const gas = await check({ refrigerant: 'R-744', temperatureC: '40' })
    expect(gas.status).toBe(422)
    expect(gas.body.detail).toMatch(/R-744 has no liquid: from 87\.\d\u00A0°F \(31\.\d\u00A0°C\) up it is a gas/)
    expect(gas.body.errors).toEqual([{ path: 'temperatureC', message: 'is outside the table of this refrigerant' }])
    // A full double is a figure like any other.
    expect((await check({ temperatureC: '26.666666666666668' })).status).toBe(200)
    expect((await check({ temperatureC: '60' })).status).toBe(200)
    expect((await check({ temperatureC: '60.1' })).status).toBe(422)
    expect((await check({ temperatureC: '-40.1' })).status).toBe(422)
  })

  it('refuses what no gauge, thermometer or barometer shows', async () => {
    const wrong: Record<string, string>[] = [
      { pressureKPa: 'high' }, { pressureKPa: '' }, { pressureKPa: '-1' }, { pressureKPa: '1e3' }, { temperatureC: '300' }, { gaugeErrorKPa: '-1' },
      { barometerKPa: '29.92' }, { pressureKPa: '10', barometerKPa: '84.3' }, { humidity: '40' },
    ]
    for (const query of wrong) expect((await check(query)).status, JSON.stringify(query)).toBe(400)
    expect((await admin.client.get('/api/pressure-check?refrigerant=R-22')).status).toBe(400)
  })

  it('is for people who are signed in', async () => {
    expect((await new TestClient(server.baseUrl).get('/api/pressure-check?refrigerant=R-22&pressureKPa=1000&temperatureC=25')).status).toBe(401)
  })
})
