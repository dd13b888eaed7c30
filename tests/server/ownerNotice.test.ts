import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ProblemDetails } from '../../utils/contract/problem'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import type { Member } from '../helpers/firm'
import { drawnPages } from '../helpers/pdfShapes'
import { pdfTexts } from '../helpers/pdfText'
import { startServer, type TestServer } from '../helpers/server'
import { lb, stampOf } from '../helpers/stamps'

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

async function print(by: Member, ref: string) {
  const cookie = [...by.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
  const answer = await fetch(`${server.baseUrl}/api/cylinders/${ref}/notice.pdf`, { headers: { cookie } })
  return { status: answer.status, type: answer.headers.get('content-type'), pdf: Buffer.from(await answer.arrayBuffer()) }
}

const tested = (id: string, result: 'passed' | 'rejected' | 'condemned', month = '2026-07') => ({
  ...eventOf(id, 'retested'), details: { month, method: 'volumetric', result, requalifierId: firm.requalifier.id },
})

describe('the notice to the owner', () => {
  it('of a customer\'s condemned cylinder is a paper for that customer, with its pages counted', async () => {
    const customer = await made<{ id: string }>(firm.admin.client, '/api/firms', { name: 'Dunmarrow Dairy', kind: 'customer', address: '1 Creamery Road' })
    const id = crypto.randomUUID()
    await posted(firm.warehouse.client, [{
      ...eventOf(id, 'registered'), placeId: firm.shop.id,
      details: { stamp: stampOf({ serial: 'DD-77' }), ownership: 'customer', ownerId: customer.id, contents: 'evacuated', gross: lb(27.5) },
    }])
    await posted(firm.manager.client, [tested(id, 'condemned')])
    const { status, type, pdf } = await print(firm.technician, id)
    expect([status, type]).toEqual([200, 'application/pdf'])
    expect(drawnPages(pdf).map(({ width, height }) => [Math.round(width), Math.round(height)])[0]).toEqual([612, 792])
    const pages = pdfTexts(pdf)
    pages.forEach((text, index) => expect(text).toContain(`Page ${index + 1} of ${pages.length}`))
    const text = pages.join('\n').replaceAll('\u00A0', ' ')
    for (const part of ['Quillfen Cooling', 'Telephone 555-0100', 'Dunmarrow Dairy', '1 Creamery Road', 'cylinder condemned', 'DD-77', 'July 2026', 'Ostwick Cylinder Tests, RIN A123', 'Nothing is in it.', 'Wear eye and hand protection.']) expect(text).toContain(part)
  })

  it('of a rejected one names the last test that rejected it, as a correction left it', async () => {
    const { id, labelCode } = await registered(firm, { contents: 'evacuated' })
    const first = { ...tested(id, 'rejected', '2026-05'), occurredAt: new Date(Date.now() - 3_600_000).toISOString() }
    const second = tested(id, 'rejected', '2026-06')
    const [view] = await posted(firm.manager.client, [second, first])
    await posted(firm.manager.client, [{ ...eventOf(id, 'corrected'), expects: view!.version, details: { eventId: second.id, reason: 'the month was April', instead: { ...second.details, month: '2026-04' } } }])
    const text = pdfTexts((await print(firm.auditor, labelCode!)).pdf).join('\n')
    expect(text).toContain('Notice to the owner: cylinder rejected')
    expect(text).toContain('April 2026')
    expect(text).not.toContain('May 2026')
  })

  it('is refused in words where there is nothing to tell, and no longer given once a test has passed', async () => {
    const { id } = await registered(firm, { contents: 'evacuated' })
    const refusal = async () => (await firm.manager.client.get<ProblemDetails>(`/api/cylinders/${id}/notice.pdf`))
    expect(await refusal()).toMatchObject({ status: 409, body: { detail: 'It is neither rejected nor condemned, so there is nothing to tell its owner.' } })
    await posted(firm.manager.client, [tested(id, 'rejected')])
    expect((await print(firm.manager, id)).status).toBe(200)
    await posted(firm.manager.client, [tested(id, 'passed')])
    expect((await refusal()).status).toBe(409)
  })

  it('is for who is signed in, of a cylinder that is known', async () => {
    expect((await firm.manager.client.get('/api/cylinders/nobody/notice.pdf')).status).toBe(404)
    expect((await fetch(`${server.baseUrl}/api/cylinders/nobody/notice.pdf`)).status).toBe(401)
  })
})
