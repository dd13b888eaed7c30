import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { PolicyAnswer } from '../../utils/contract/policy'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { CompositionRecordAnswer, FillLimitAnswer, RefrigerantRecordAnswer, RefrigerantsAnswer, SaturationAnswer } from '../../utils/contract/refrigerants'
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

function fillLimit(query: Record<string, string>) {
  const stamp = { refrigerant: 'R-22', waterCapacity: '24.0lb', tareWeight: '15.0lb', spec: 'DOT-4BA400' }
  return admin.client.get<FillLimitAnswer & ProblemDetails>(`/api/fill-limit?${new URLSearchParams({ ...stamp, ...query })}`)
}

describe('the fill limit of a stamp', () => {
  it('is 0.80 of the water capacity for R-22, and stops at 34.2 lb', async () => {
    const { status, body } = await fillLimit({ gross: '34.0lb' })
    expect(status).toBe(200)
    // 0.80 x 24.0 = 19.2 lb = 8708.97 g; 15.0 + 19.2 = 34.2 lb = 15512.86 g; 34.0 - 15.0 = 19.0 lb: 15422 - 6804 = 8618 g.
    expect(body).toMatchObject({
      forRefrigerant: 'R-22', governingRule: 'water-weight', fillLimitGrams: 8_708, stopWeightGrams: 15_512,
      netGrams: 8_618, roomGrams: 90, share: 0.8, missing: [], refusals: [],
    })
    expect(body.exactStopWeightGrams).toBeCloseTo(15_512.859, 3)
    expect(body.terms.find(term => term.rule === 'water-weight')).toMatchObject({ limitGrams: 8_708, standing: 'in-force' })
  })

  it('takes the pressure from the specification or beside it, and refuses two that differ', async () => {
    const beside = await fillLimit({ spec: 'DOT-4BA', servicePressurePsig: '400' })
    expect(beside.body.stopWeightGrams).toBe(15_512)
    expect((await fillLimit({ servicePressurePsig: '350' })).status).toBe(422)
  })

  it('takes a designation in any case, and says it as the catalogue does', async () => {
    expect((await fillLimit({ refrigerant: 'r-22' })).body).toMatchObject({ forRefrigerant: 'R-22', fillLimitGrams: 8_708 })
    expect((await fillLimit({ refrigerant: 'r-407d' })).body.forRefrigerant).toBe('R-407D')
  })

  it('takes a stricter share than the firm\'s and never a looser one', async () => {
    // 0.75 x 24.0 = 18.0 lb = 8164.66 g.
    expect((await fillLimit({ share: '0.75' })).body).toMatchObject({ share: 0.75, fillLimitGrams: 8_164 })
    expect((await fillLimit({ share: '0.81' })).status).toBe(400)
    expect((await fillLimit({ share: '0.01' })).body.share).toBe(0.01)
    const { status, body } = await fillLimit({ share: '0.0099' })
    expect(status).toBe(400)
    expect(body.errors).toEqual([{ path: 'share', message: 'must be at least 0.01' }])
  })

  it('gives no stop weight where something is not known, and names it', async () => {
    const noTare = await admin.client.get<FillLimitAnswer>('/api/fill-limit?refrigerant=R-22&waterCapacity=24.0lb&spec=DOT-4BA400')
    expect(noTare.body).toMatchObject({ stopWeightGrams: null, roomGrams: null, netGrams: null, missing: ['tareWeight', 'weight'] })
    const noPressure = await fillLimit({ spec: 'DOT-4BA', gross: '20lb' })
    expect(noPressure.body).toMatchObject({ stopWeightGrams: null, roomGrams: null, missing: ['servicePressure'] })
    expect((await fillLimit({ condition: 'mixed' })).body).toMatchObject({ fillLimitGrams: null, stopWeightGrams: null })
  })

  it('gives no stop weight for a refrigerant that the cylinder is too weak for, and says why', async () => {
    const { body } = await fillLimit({ refrigerant: 'R-410A', spec: 'DOT-4BA260', gross: '20lb' })
    expect(body.refusals.map(refusal => refusal.code)).toEqual(['pressure-class'])
    expect(body).toMatchObject({ stopWeightGrams: null, exactStopWeightGrams: null, roomGrams: null })
    expect(body.fillLimitGrams).toBeGreaterThan(0)
  })

  it('has a negative room above the limit, and no net where the weight is below the tare', async () => {
    // 36.0 - 15.0 = 21.0 lb: 16329 - 6804 = 9525 g; 8708 - 9525.
    expect((await fillLimit({ gross: '36.0lb' })).body).toMatchObject({ netGrams: 9_525, roomGrams: -817 })
    expect((await fillLimit({ gross: '14.0lb' })).body).toMatchObject({ netGrams: null, roomGrams: null, stopWeightGrams: 15_512, missing: ['weight'] })
    // 14.95 lb is 23 g below, within 0.5 % of the reading.
    expect((await fillLimit({ gross: '14.95lb' })).body).toMatchObject({ netGrams: 0, roomGrams: 8_708 })
  })

  it('says how full of liquid it is at 131 F and when it is liquid-full', async () => {
    // 24.0 lb = 10.886217 kg, / 0.99904 = 10.896678 L; R-22: 8618 g / 10.896678 L = 790.88 kg/m3; (790.88 - 97.9) / (1057.2 - 97.9).
    const { body } = await fillLimit({ gross: '34.0lb' })
    expect(body.hotLiquidShare).toBeCloseTo(0.72238, 4)
    expect(body.liquidFull).toEqual({ aboveC: 70 })
    // R-410A: 60.0 - 15.0 = 45.0 lb in a cylinder of 24.0 lb of water are more than any liquid of it.
    expect((await fillLimit({ refrigerant: 'R-410A', gross: '60.0lb' })).body).toMatchObject({ hotLiquidShare: 1, liquidFull: { c: -40 } })
    expect((await fillLimit({ refrigerant: 'R-410A', gross: '15.5lb' })).body).toMatchObject({ hotLiquidShare: 0, liquidFull: { never: true } })
  })

  it('lists every rule with its factors, its sum in words and its source', async () => {
    const { body } = await fillLimit({ condition: 'burnt' })
    expect(body.terms.map(term => term.rule)).toEqual([
      'water-weight', 'liquid-77F', 'filling-density', 'hot-ceiling', 'hot-pressure', 'liquid-130F', 'un-ratio', 'oily',
    ])
    expect(body.governingRule).toBe('oily')
    const water = body.terms.find(term => term.rule === 'water-weight')
    expect(water?.factors).toEqual([{ name: 'share', value: 0.8, unit: '' }, { name: 'water-capacity', value: 24, unit: 'lb' }])
    expect(water?.working.replaceAll('\u00A0', ' ')).toBe('0.80 × WC 24.0 lb = 19.20 lb')
    expect(body.terms.find(term => term.rule === 'hot-pressure')).toMatchObject({ limitGrams: null, because: expect.stringContaining('R-22') })
  })

  it('takes a named blend that is known by its composition, but has no stop weight for it', async () => {
    const { status, body } = await fillLimit({ refrigerant: 'R-407D', gross: '20lb' })
    expect(status).toBe(200)
    expect(body).toMatchObject({ forRefrigerant: 'R-407D', fillLimitGrams: 8_708, stopWeightGrams: null, roomGrams: null })
    expect(body.refusals.map(refusal => refusal.code)).toContain('pressure-class')
  })

  it.each([
    [{ waterCapacity: '24' }, 400], [{ waterCapacity: '-24lb' }, 400], [{ tareWeight: '15lb17oz' }, 400], [{ spec: 'DOT-9' }, 400],
    [{ waterCapacity: '0lb' }, 400], [{ waterCapacity: '0lb0oz' }, 400], [{ tareWeight: '0kg' }, 400], [{ waterCapacity: '100001lb' }, 400], [{ gross: '999999999999999999kg' }, 400],
    [{ colour: 'red' }, 400], [{ servicePressurePsig: '0' }, 400], [{ refrigerant: 'R-9999' }, 422],
  ])('refuses %j with %i', async (query, status) => {
    expect((await fillLimit(query as unknown as Record<string, string>)).status).toBe(status)
  })
})

describe('the fill limit of a composition', () => {
  function ofComposition(composition: string, more: Record<string, string> = {}) {
    const query = new URLSearchParams({ composition, waterCapacity: '24.0lb', tareWeight: '15.0lb', spec: 'DOT-4BA400', flammableMarked: 'true', ...more })
    return admin.client.get<FillLimitAnswer & ProblemDetails>(`/api/fill-limit?${query}`)
  }

  it('is that of its parts by ideal mixing less 5 %, without a stop weight because its pressure is not known', async () => {
    const { status, body } = await ofComposition('R-32:50,R-125:50')
    expect(status).toBe(200)
    // At 131 F 827.916 kg/m3 with the derate; x 0.95 x 10.896678 L = 8,570.5 g, less than 80 % of the water, 8,708 g.
    expect(body).toMatchObject({ forRefrigerant: 'R-32/R-125 (50/50)', governingRule: 'hot-ceiling', fillLimitGrams: 8_570, stopWeightGrams: null })
    expect(body.refusals.map(refusal => refusal.code)).toEqual(['pressure-class'])
    expect(body.terms.find(term => term.rule === 'hot-ceiling')?.factors.map(factor => factor.name))
      .toEqual(['share', 'volume', 'liquid-density', 'derate'])
  })

  it.each([
    ['R-32:50,R-125:49.8', 'sum to 99.8 %'], ['R-9999:100', 'R-9999'], ['R-32:97,R-744:3', 'critical temperature'], ['R-32:50,R-32:50', 'twice'],
  ])('is refused for %s, with the reason', async (composition, reason) => {
    const { status, body } = await ofComposition(composition)
    expect(status).toBe(422)
    expect(body.errors?.[0]).toMatchObject({ path: 'composition', message: expect.stringContaining(reason) })
  })

  it.each(['R-32', 'R-32:fifty', 'R-32:50;R-125:50', ''])('is refused as no composition: "%s"', async (composition) => {
    expect((await ofComposition(composition)).status).toBe(400)
  })

  it('takes its parts in any case, and a part in two cases as one', async () => {
    expect((await ofComposition('r-32:50,r-125:50')).body).toMatchObject({ forRefrigerant: 'R-32/R-125 (50/50)', fillLimitGrams: 8_570 })
    expect((await ofComposition('R-32:50,r-32:50')).status).toBe(422)
  })

  it('is asked for in place of a refrigerant: never with one, and not with neither', async () => {
    expect((await ofComposition('R-32:50,R-125:50', { refrigerant: 'R-22' })).status).toBe(422)
    const neither = await admin.client.get('/api/fill-limit?waterCapacity=24.0lb&tareWeight=15.0lb&spec=DOT-4BA400')
    expect(neither.status).toBe(422)
  })
})

describe('the catalogue of refrigerants', () => {
  it('lists 79, each with its safety class', async () => {
    const { body } = await admin.client.get<RefrigerantsAnswer>('/api/refrigerants')
    expect(body.items).toHaveLength(79)
    expect(body.items.find(one => one.designation === 'R-32')).toMatchObject({ safetyClass: 'A2L', flammable: true, toxic: false })
    expect(body.items.find(one => one.designation === 'R-717')).toMatchObject({ safetyClass: 'B2L', flammable: true, toxic: true })
  })

  it('gives each its pressure class and the GWP that stands for it, and lists known blends beside', async () => {
    const { body } = await admin.client.get<RefrigerantsAnswer>('/api/refrigerants')
    const line = (designation: string) => body.items.find(one => one.designation === designation)
    // 40 CFR 82.152 names R-22 high and R-134a medium; 42 USC 7675(c) gives R-134a 1430, IPCC AR4 R-22 1810.
    expect(line('R-22')).toMatchObject({ pressureClass: 'high', gwp: { basis: 'AR4', value: 1810 } })
    expect(line('R-134a')).toMatchObject({ pressureClass: 'medium', gwp: { basis: 'exchange-value', value: 1430 } })
    // 10 % R-32, 70 % R-125, 20 % R-134a: 2803.5.
    expect(body.compositions.find(one => one.designation === 'R-407B')).toMatchObject({ gwp: { basis: 'exchange-value', value: 2803.5 } })
  })

  it('gives one its properties, its class, its GWPs, its transport entry and its doubt', async () => {
    const { body } = await admin.client.get<RefrigerantRecordAnswer>('/api/refrigerants/R-454B')
    expect(body.known).toBe('properties')
    expect(body.unEntry).toMatchObject({ un: 'UN3161', division: '2.1' })
    expect(body.noUnEntryBecause).toBeNull()
    expect(body.pressureClass).toMatchObject({ pressureClass: 'high', nearBound: null })
    // 0.689 x 675 + 0.311 x 1.
    expect(body.gwp.find(one => one.basis === 'exchange-value')?.value).toBeCloseTo(465.39, 2)
    expect(body.gwp.find(one => one.basis === 'AR4')?.value).toBeNull()
    expect(body.points.map(point => point.temperatureF)).toEqual([32, 70, 77, 104, 130, 131])
    expect(body.points.every(point => point.saturation!.bubblePressureKPa > point.saturation!.dewPressureKPa)).toBe(true)
    expect(body.curve.length).toBeGreaterThan(15)
    const { body: weak } = await admin.client.get<RefrigerantRecordAnswer>('/api/refrigerants/R-413A')
    expect(weak.doubt).toContain('3.6 K')
  })

  it('gives carbon dioxide no numbers past the end of its table, nor above its critical temperature', async () => {
    const { body } = await admin.client.get<RefrigerantRecordAnswer>('/api/refrigerants/R-744')
    expect(body.pressureClass.at104F).toEqual({ aboveCritical: true })
    // Its table ends at 21.1 °C, which is 70 °F by the tenth of a degree.
    expect(body.points.filter(point => point.saturation === null).map(point => point.temperatureF)).toEqual([77, 104, 130, 131])
  })

  it('knows of a blend outside the catalogue what it is made of, and nothing more', async () => {
    const { body } = await admin.client.get<CompositionRecordAnswer>('/api/refrigerants/r-407b')
    expect(body).toMatchObject({ known: 'composition', designation: 'R-407B', unEntry: { un: 'UN3339', division: '2.2' } })
    expect(body.compositionSource).not.toBe('')
    expect(body).not.toHaveProperty('points')
    expect((await admin.client.get('/api/refrigerants/R-407B/saturation?temperatureC=25')).status).toBe(404)
  })

  it('says what one is made of and from where it is known, in any case', async () => {
    const { body } = await admin.client.get<RefrigerantRecordAnswer>('/api/refrigerants/r-410a')
    expect(body.designation).toBe('R-410A')
    expect(body.composition).toEqual([{ component: 'R-32', massPercent: 50 }, { component: 'R-125', massPercent: 50 }])
    expect(body.source).not.toBe('')
    expect(body).not.toHaveProperty('table')
    expect(body).not.toHaveProperty('curves')
    expect(body).not.toHaveProperty('curves')
    expect((await admin.client.get('/api/refrigerants/R-9999')).status).toBe(404)
  })

  it('gives the saturation inside the table and refuses outside it', async () => {
    // R-22 at 25 C: 1044 kPa and 1191 kg/m3 (from memory of published tables).
    const { body } = await admin.client.get<SaturationAnswer>('/api/refrigerants/R-22/saturation?temperatureC=25')
    expect(Math.abs(body.bubblePressureKPa / 1044 - 1)).toBeLessThan(0.005)
    expect(Math.abs(body.liquidDensity / 1191 - 1)).toBeLessThan(0.005)
    const coldest = await admin.client.get('/api/refrigerants/R-22/saturation?temperatureC=-40')
    const colder = await admin.client.get<ProblemDetails>('/api/refrigerants/R-22/saturation?temperatureC=-40.1')
    expect([coldest.status, colder.status]).toEqual([200, 422])
    expect((await admin.client.get('/api/refrigerants/R-744/saturation?temperatureC=54.4')).status).toBe(422)
    expect((await admin.client.get('/api/refrigerants/R-22/saturation?temperatureC=warm')).status).toBe(400)
    expect((await admin.client.get('/api/refrigerants/R-22/saturation')).status).toBe(400)
  })

  it('and the firm\'s rules are for people who are signed in', async () => {
    const stranger = new TestClient(server.baseUrl)
    for (const path of ['/api/refrigerants', '/api/refrigerants/R-22', '/api/fill-limit', '/api/policy']) {
      expect((await stranger.get(path)).status).toBe(401)
    }
  })
})

describe('the firm\'s rules', () => {
  it('begin with the default fill rule and the days of its reminders', async () => {
    const { body } = await admin.client.get<PolicyAnswer>('/api/policy')
    expect(body.timeZone).toBe('America/Chicago')
    expect(body.fillPolicies).toEqual([{ fromAt: 0, policy: { shareThousandths: 800, ceilingThousandths: 950, options: { liquid130F: false, unRatio: false } } }])
    expect(body.retest).toEqual({ soonDays: 120, notSeenDays: 30, missingDays: 90, intervalMonths: null, ownerChoices: [] })
  })
})
