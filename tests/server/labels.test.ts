import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { MintAnswer } from '../../utils/contract/labels'
import type { ProblemDetails } from '../../utils/contract/problem'
import { isLabelCode } from '../../utils/label/code'
import type { Member } from '../helpers/firm'
import { made, openShop, registered, type Shop } from '../helpers/fleet'
import { drawnPages, symbolsOf, type DrawnPage } from '../helpers/pdfShapes'
import { symbolTexts } from '../helpers/printedPage'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

async function printed(person: Member, query: string): Promise<{ headers: Headers, pages: DrawnPage[] }> {
  const cookie = [...person.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
  const answer = await fetch(`${server.baseUrl}/api/labels.pdf?${query}`, { headers: { cookie } })
  return { headers: answer.headers, pages: drawnPages(Buffer.from(await answer.arrayBuffer())) }
}

describe('minting label codes', () => {
  it('gives as many as asked for, every one different and with its check character', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 100 })
    expect(new Set(codes).size).toBe(100)
    expect(codes.every(isLabelCode)).toBe(true)
  })

  it.each([0, 101, 1.5, '3'])('refuses %s of them', async (count) => {
    expect((await firm.warehouse.client.post('/api/labels', { count })).status).toBe(400)
  })

  it('is for the warehouse and the manager', async () => {
    const body = { count: 1 }
    const statuses = await Promise.all([firm.warehouse, firm.manager, firm.technician, firm.auditor, firm.admin]
      .map(async person => (await person.client.post('/api/labels', body)).status))
    expect(statuses).toEqual([201, 201, 403, 403, 403])
  })
})

describe('printing labels', () => {
  it('prints both labels of a code, each with the address of its cylinder', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 2 })
    const { headers, pages } = await printed(firm.warehouse, `codes=${codes.join(',')}&stock=roll-4x2`)
    expect(headers.get('content-type')).toBe('application/pdf')
    expect(headers.get('content-disposition')).toBe('inline; filename="cylinder-labels.pdf"')
    const texts = await Promise.all(pages.map(symbolTexts))
    expect(texts).toEqual([codes[0], codes[0], codes[1], codes[1]].map(code => [`${server.baseUrl.toUpperCase()}/C/${code}`]))
  })

  it('leaves lines to write on for a code that is on no cylinder yet, and none for one that is', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    const { labelCode } = await registered(firm)
    const [blank, known] = await Promise.all([printed(firm.warehouse, `codes=${codes[0]}`), printed(firm.warehouse, `codes=${labelCode}`)])
    // A symbol and a dividing line; a blank one has a line each for SN, Spec, TW and WC.
    expect(blank.pages[0]!.fills).toHaveLength(6)
    expect(known.pages[0]!.fills).toHaveLength(2)
  })

  it('begins at the free label of a part-used sheet', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    const { pages } = await printed(firm.warehouse, `codes=${codes[0]}&stock=letter-10&start=10`)
    expect(pages.map(page => symbolsOf(page).length)).toEqual([1, 1])
    for (const place of ['stock=letter-10&start=11', 'stock=roll-4x2&start=2', 'start=0', 'stock=a4']) {
      expect((await firm.warehouse.client.get(`/api/labels.pdf?codes=${codes[0]}&${place}`)).status).toBe(400)
    }
  })

  it('names the codes that nobody made, and takes no malformed one', async () => {
    const unknown = await firm.warehouse.client.get<ProblemDetails>('/api/labels.pdf?codes=7K3M9Q2TX')
    expect(unknown.status).toBe(404)
    expect(unknown.body.detail).toContain('7K3M9Q2TX')
    expect((await firm.warehouse.client.get('/api/labels.pdf?codes=7K3M9Q2TY')).status).toBe(400)
    expect((await firm.warehouse.client.get('/api/labels.pdf?codes=')).status).toBe(400)
    expect((await firm.technician.client.get('/api/labels.pdf?codes=7K3M9Q2TX')).status).toBe(403)
  })
})
