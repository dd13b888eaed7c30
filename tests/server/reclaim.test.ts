import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/utils/database/database'
import type { OwnFirm } from '../../utils/contract/firm'
import type { NowAnswer } from '../../utils/contract/now'
import type { Firm, Place } from '../../utils/contract/places'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { PriceRow, PricesAnswer, TermsAnswer, TermsRow, WorthAnswer } from '../../utils/contract/reclaim'
import type { ShipmentWithLines } from '../../utils/contract/shipments'
import type { ReclaimerTerms } from '../../utils/reclaim/terms'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'

const TERMS: ReclaimerTerms = {
  refrigerants: [{ designation: 'R-22', conditions: ['clean', 'suspect'] }], takesMixed: false, takesUnknown: false, takesOverdue: false,
  specs: ['DOT-4BA'], pressuresPsig: [400], mostContaminationPercent: 5, minimum: lb(25), minimumCylinders: null, pickUpCents: 2_000, note: null,
}
const DAY_MS = 86_400_000
const LAG = { timeout: 20_000, interval: 500 }

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

function dayFromNow(days: number): string {
  // In the time zone of the firm.
  return new Intl.DateTimeFormat('en-CA', { timeZone: 'America/Chicago' }).format(Date.now() + days * DAY_MS)
}

const path = (what: 'terms' | 'prices', id = firm.reclaimer.id) => `/api/firms/${id}/${what}`
const price = (more: object = {}) => ({ id: randomUUID(), refrigerant: 'R-22', condition: 'clean', fromDay: dayFromNow(-10), mills: 5_000, per: 'lb', ...more })

/** Has what was recorded today have been recorded a month ago. */
async function recordedLongAgo(table: 'firm_terms' | 'firm_prices'): Promise<void> {
  const db = await openDatabase(`file:${server.databaseFile}`)
  await db.write([{ sql: `UPDATE ${table} SET recorded_at = recorded_at - ?`, args: [30 * DAY_MS] }])
  db.close()
}

async function worth(): Promise<WorthAnswer> {
  return (await firm.warehouse.client.get<WorthAnswer>('/api/reclaim/worth')).body
}

describe('what a reclaimer takes', () => {
  it('is set by the manager, read by the desk, and kept from the technician', async () => {
    const row = { id: randomUUID(), fromDay: dayFromNow(-10), terms: TERMS }
    for (const who of [firm.warehouse, firm.auditor, firm.admin, firm.technician]) expect((await who.client.post(path('terms'), row)).status).toBe(403)
    expect((await firm.manager.client.post<TermsRow>(path('terms'), row)).body).toMatchObject({ fromDay: row.fromDay, terms: TERMS, recordedBy: { name: 'Mona' }, withdrawn: null })
    for (const who of [firm.warehouse, firm.auditor, firm.manager]) expect((await who.client.get<TermsAnswer>(path('terms'))).body.items).toHaveLength(1)
    for (const what of ['terms', 'prices'] as const) expect((await firm.technician.client.get(path(what))).status).toBe(403)
    expect((await firm.technician.client.get('/api/reclaim/worth')).status).toBe(403)
    expect((await firm.technician.client.get<Firm>(`/api/firms/${firm.reclaimer.id}`)).body).toMatchObject({ name: 'Tarnvale Reclaim', kind: 'reclaimer' })
    expect((await firm.technician.client.get(`/api/firms/${randomUUID()}`)).status).toBe(404)
  })

  it('sent again changes nothing, and another content under its id is refused', async () => {
    const row = { id: randomUUID(), fromDay: dayFromNow(-5), terms: { ...TERMS, note: 'Ring first.' } }
    const before = (await firm.manager.client.get<TermsAnswer>(path('terms'))).body.items.length
    expect((await firm.manager.client.post(path('terms'), row)).status).toBe(201)
    expect((await firm.manager.client.post(path('terms'), row)).status).toBe(201)
    expect((await firm.manager.client.post(path('terms'), { ...row, terms: TERMS })).status).toBe(409)
    expect((await firm.manager.client.get<TermsAnswer>(path('terms'))).body.items).toHaveLength(before + 1)
  })

  it('belongs to a reclaimer alone, and what cannot be is refused by its field', async () => {
    const row = { fromDay: dayFromNow(0), terms: TERMS }
    expect((await firm.manager.client.post(path('terms', firm.requalifier.id), row)).status).toBe(422)
    expect((await firm.manager.client.post(path('terms', randomUUID()), row)).status).toBe(404)
    const wrong = async (change: object) => {
      const answer = await firm.manager.client.post<ProblemDetails>(path('terms'), { ...row, terms: { ...TERMS, ...change } })
      return [answer.status, ...answer.body.errors?.map(error => error.path) ?? []]
    }
    expect(await wrong({ specs: ['DOT-5'] })).toEqual([400, 'terms.specs.0'])
    expect(await wrong({ refrigerants: [{ designation: 'R-22', conditions: ['mixed'] }] })).toEqual([400, 'terms.refrigerants.0.conditions.0'])
    expect(await wrong({ refrigerants: [TERMS.refrigerants[0], TERMS.refrigerants[0]] })).toEqual([400, 'terms.refrigerants'])
    expect(await wrong({ mostContaminationPercent: 100.1 })).toEqual([400, 'terms.mostContaminationPercent'])
    expect(await wrong({ pickUpCents: -1 })).toEqual([400, 'terms.pickUpCents'])
    expect((await firm.manager.client.post(path('terms'), { ...row, fromDay: '2026-02-30' })).status).toBe(400)
  })

  it('is taken back before it begins and on the day it was recorded, not once it counts', async () => {
    await recordedLongAgo('firm_terms')
    const past = (await firm.manager.client.get<TermsAnswer>(path('terms'))).body.items
    expect((await firm.manager.client.post(`${path('terms')}/${past[0]!.id}/withdraw`)).status).toBe(409)
    const coming = await made<TermsRow>(firm.manager.client, path('terms'), { fromDay: dayFromNow(5), terms: { ...TERMS, refrigerants: [] } })
    await recordedLongAgo('firm_terms')
    expect((await firm.warehouse.client.post(`${path('terms')}/${coming.id}/withdraw`)).status).toBe(403)
    for (const _ of [1, 2]) expect((await firm.manager.client.post<TermsRow>(`${path('terms')}/${coming.id}/withdraw`)).body).toMatchObject({ withdrawn: { by: { name: 'Mona' } }, mayWithdraw: false })
    expect((await firm.manager.client.post(`${path('terms')}/${randomUUID()}/withdraw`)).status).toBe(404)
    expect((await firm.manager.client.get<TermsAnswer>(path('terms'))).body.items).toHaveLength(past.length + 1)
  })
})

describe('what a reclaimer pays', () => {
  it('is recorded from a day to another, charges below zero, and stays in the history', async () => {
    expect((await firm.warehouse.client.post(path('prices'), price())).status).toBe(403)
    const first = await made<PriceRow>(firm.manager.client, path('prices'), price({ fromDay: dayFromNow(-40), mills: 4_000 }))
    await made(firm.manager.client, path('prices'), price())
    const coming = await made<PriceRow>(firm.manager.client, path('prices'), price({ fromDay: dayFromNow(20), mills: 9_000 }))
    const charge = price({ refrigerant: null, condition: 'mixed', mills: -2_500, untilDay: dayFromNow(300) })
    await made(firm.manager.client, path('prices'), charge)
    expect((await firm.manager.client.post(path('prices'), charge)).status).toBe(201)
    expect((await firm.manager.client.post(path('prices'), { ...charge, mills: -2_400 })).status).toBe(409)
    await recordedLongAgo('firm_prices')
    expect((await firm.manager.client.post(`${path('prices')}/${first.price.id}/withdraw`)).status).toBe(409)
    expect((await firm.manager.client.post(`${path('prices')}/${coming.price.id}/withdraw`)).status).toBe(200)
    const { items } = (await firm.auditor.client.get<PricesAnswer>(path('prices'))).body
    expect(items.map(({ price: one, withdrawn }) => [one.rate.mills, withdrawn !== null])).toEqual([[-2_500, false], [9_000, true], [5_000, false], [4_000, false]])
  })

  it('wants days in their order, a possible amount, and no clean contents without a name', async () => {
    const wrong = async (change: object) => {
      const answer = await firm.manager.client.post<ProblemDetails>(path('prices'), price(change))
      return [answer.status, ...answer.body.errors?.map(error => error.path) ?? []]
    }
    expect(await wrong({ untilDay: dayFromNow(-11) })).toEqual([400, 'untilDay'])
    expect(await wrong({ mills: 2.5 })).toEqual([400, 'mills'])
    expect(await wrong({ mills: 10_000_001 })).toEqual([400, 'mills'])
    expect(await wrong({ refrigerant: null })).toEqual([400, 'condition'])
    expect(await wrong({ condition: 'spotless' })).toEqual([400, 'condition'])
  })
})

describe('what is worth shipping', () => {
  it('is what the reclaimer takes of the stock in a shop, with its value, and what it refuses with the reasons', async () => {
    // Each holds 12.5 lb, 5,670 g: at $5.00 a lb 5,670 g are $62.5010 each. Nothing is worth a pick-up below 25 lb.
    const [first, second] = [await registered(firm), await registered(firm)]
    const [unlabelled, other] = [await registered(firm, { isLabelled: false }), await registered(firm, { contents: { refrigerant: 'R-32', condition: 'clean' } })]
    const mixed = await registered(firm, { contents: { refrigerant: 'R-22', condition: 'mixed' } })
    await registered(firm, { contents: 'evacuated' })
    const van = await made<Place>(firm.admin.client, '/api/places', { name: 'Van 02', kind: 'van' })
    const aboard = await registered(firm)
    await posted(firm.warehouse.client, [{ ...eventOf(aboard.id, 'moved'), details: { toPlaceId: van.id } }])

    const answer = await worth()
    expect(answer).toMatchObject({ stock: 6, isAll: true, places: [{ name: 'North shop' }], elsewhere: [{ place: { name: 'Van 02' }, cylinders: 1, netGrams: 5_670 }] })
    expect(answer.offers).toHaveLength(1)
    const [offer] = answer.offers
    expect(offer!.lines).toEqual([{
      refrigerant: 'R-22', condition: 'clean', owner: { is: 'ours' }, cylinders: 2, cylinderIds: [first.id, second.id].sort(), notWeighed: 0, netGrams: 11_340,
      rate: { mills: 5_000, per: 'lb' }, valueCents: 12_500, comesFree: 2,
    }])
    expect(offer!.refusedCylinders).toBe(3)
    expect(Object.fromEntries(offer!.refused.map(({ text, first: some }) => [text, some.map(({ id }) => id)]))).toEqual({
      'Has no label: label it first.': [unlabelled.id],
      'The reclaimer does not take R-32.': [other.id],
      'The reclaimer does not take mixed contents.': [mixed.id],
    })
  })

  it('is told to who ships once the minimum is reached, and not before', async () => {
    const lines = async () => (await firm.manager.client.get<NowAnswer>('/api/now')).body.lines.filter(({ topic }) => topic === 'worth-pick-up')
    // 11,340 g are 25.0 lb, by a fraction of a gram. A line may lag where the server is slow.
    await expect.poll(lines, LAG).toMatchObject([{ number: 2, sentence: '25.0\u00A0lb of R-22 are worth a pick-up.', to: '/reclaim' }])
    await made(firm.manager.client, path('terms'), { fromDay: dayFromNow(0), terms: { ...TERMS, minimum: lb(25.1) } })
    await expect.poll(lines, LAG).toEqual([])
    await made(firm.manager.client, path('terms'), { fromDay: dayFromNow(0), terms: { ...TERMS, takesMixed: true } })
  })

  it('takes mixed contents only up to the share that an analysis shows', async () => {
    const [mixed] = (await worth()).offers[0]!.refused.find(({ text }) => text.includes('never analysed'))!.first
    const analysed = async (others: number) => {
      await posted(firm.warehouse.client, [{
        ...eventOf(mixed!.id, 'checked'),
        details: { method: 'identifier', composition: [{ component: 'R-22', massPercent: 100 - others }, { component: 'R-12', massPercent: others }], verdict: { refrigerant: 'R-22', condition: 'mixed' } },
      }])
      return (await worth()).offers[0]!
    }
    expect((await analysed(5.1)).refused.map(({ text }) => text)).toContain('The reclaimer takes at most 5 % of other refrigerants; by its last analysis this holds 5.1 %.')
    // 5,670 g at $2.50 a lb are $31.2505, charged.
    expect((await analysed(5)).lines.map(({ condition, valueCents }) => [condition, valueCents])).toEqual([['clean', 12_500], ['mixed', -3_125]])
  })

  it('leaves a customer\'s refrigerant the customer\'s', async () => {
    const dairy = await made<Firm>(firm.admin.client, '/api/firms', { name: 'Dunmarrow Dairy', kind: 'customer' })
    const empty = await registered(firm, { contents: 'evacuated' })
    await posted(firm.warehouse.client, [{ ...eventOf(empty.id, 'filled'), details: { refrigerant: 'R-22', grossAfter: lb(37.5), ownerOfRefrigerantId: dairy.id, looked: true } }])
    const answer = await worth()
    expect(answer.owners).toMatchObject([{ name: 'Dunmarrow Dairy' }])
    expect(answer.offers[0]!.lines.find(({ owner }) => owner.is === 'customer')).toMatchObject({ owner: { id: dairy.id }, cylinders: 1, condition: 'clean' })
  })

  it('becomes a draft with its cylinders, which are then on a list and offered no more', async () => {
    const ours = (await worth()).offers[0]!.lines.find(({ owner, condition }) => owner.is === 'ours' && condition === 'clean')!
    const draft = await made<ShipmentWithLines>(firm.warehouse.client, '/api/shipments', { toFirmId: firm.reclaimer.id, cylinderIds: ours.cylinderIds })
    expect(draft).toMatchObject({ state: 'draft', cylinders: 2 })
    const after = await worth()
    expect(after.stock).toBe(5)
    expect(after.offers[0]!.lines.flatMap(({ cylinderIds }) => cylinderIds)).not.toContain(ours.cylinderIds[0])
  })

  it('says of whom it is not recorded what they take', async () => {
    await made(firm.admin.client, '/api/firms', { name: 'Brindmoor Gas Recovery', kind: 'reclaimer' })
    expect((await worth()).reclaimers.map(({ name, terms }) => [name, terms === null])).toEqual([['Brindmoor Gas Recovery', true], ['Tarnvale Reclaim', false]])
  })
})

describe('our own firm', () => {
  it('says who answers in an emergency, which an admin keeps and everybody reads', async () => {
    const change = { address: '200 Millrace Street', emergencyTelephone: '555-0142', emergencyContract: 'Quillfen, contract 555-77' }
    expect((await firm.manager.client.patch('/api/firm', change)).status).toBe(403)
    expect((await firm.admin.client.patch<OwnFirm>('/api/firm', change)).body).toMatchObject(change)
    expect((await firm.technician.client.get<OwnFirm>('/api/firm')).body).toMatchObject(change)
    expect((await firm.admin.client.patch<OwnFirm>('/api/firm', { emergencyContract: null })).body).toMatchObject({ emergencyTelephone: '555-0142', emergencyContract: null })
    expect((await firm.admin.client.patch<ProblemDetails>('/api/firm', { emergencyTelephone: '' })).body.errors).toMatchObject([{ path: 'emergencyTelephone' }])
  })
})
