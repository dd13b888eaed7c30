import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { LabelAddress, MintAnswer } from '../../utils/contract/labels'
import type { ProblemDetails } from '../../utils/contract/problem'
import { formatLabelCode, isLabelCode } from '../../utils/label/code'
import type { Member } from '../helpers/firm'
import { cylinderNow, eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { boundsOf, drawnPages, symbolsOf, type DrawnPage } from '../helpers/pdfShapes'
import { symbolTexts } from '../helpers/printedPage'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

async function printed(person: Member, query: string, path = '/api/labels.pdf'): Promise<{ headers: Headers, pages: DrawnPage[] }> {
  const cookie = [...person.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
  const answer = await fetch(`${server.baseUrl}${path}?${query}`, { headers: { cookie } })
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
    for (const place of ['stock=letter-10&start=11', 'stock=roll-4x2&start=2', 'start=0', 'stock=a4', 'x=2.5', 'x=0.4', 'dpi=600', 'stock=a4-8&dpi=203.2', 'diameter=40']) {
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

  it('moves the print by the printer\'s offset and fits the symbol to the cylinder', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    const box = async (query: string) => boundsOf(symbolsOf((await printed(firm.warehouse, `codes=${codes[0]}&${query}`)).pages[0]!)[0]!)
    const [usual, moved, narrow] = await Promise.all([box('stock=roll-4x2'), box('stock=roll-4x2&x=1.5&y=-0.5'), box('stock=roll-4x2&diameter=152.4')])
    expect((moved.left - usual.left) / 72 * 25.4).toBeCloseTo(1.5, 3)
    expect((moved.top - usual.top) / 72 * 25.4).toBeCloseTo(-0.5, 3)
    // 0.14 x 152.4 mm.
    expect((narrow.right - narrow.left) / 72 * 25.4).toBeLessThanOrEqual(21.336)
    expect((usual.right - usual.left) / 72 * 25.4).toBeGreaterThan(21.336)
  })

  it('begins a new roll with a label that says what to mind', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    const { pages } = await printed(firm.warehouse, `codes=${codes[0]}&stock=roll-2x1&advice=1`)
    expect(pages.map(page => symbolsOf(page).length)).toEqual([0, 1, 1])
  })

  it('prints none that would not be read round a cylinder that narrow', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    const { status, body } = await firm.warehouse.client.get<ProblemDetails>(`/api/labels.pdf?codes=${codes[0]}&diameter=60`)
    expect(status).toBe(422)
    expect(body.detail).toContain('the flat of the guard')
  })
})

describe('a blank label', () => {
  it('opens nothing until it is bound to a cylinder, and that cylinder from then on', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    const { id } = await registered(firm, { isLabelled: false })
    expect((await firm.technician.client.get(`/api/cylinders/${codes[0]}`)).status).toBe(404)
    await posted(firm.technician.client, [{ ...eventOf(id, 'labelled'), details: { code: codes[0] } }])
    expect(await cylinderNow(firm.technician.client, codes[0]!)).toMatchObject({ id, labelCode: codes[0] })
  })

  it('stuck on two cylinders stops both, and opens the one that had it first', async () => {
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    const [first, second] = [await registered(firm, { isLabelled: false }), await registered(firm, { isLabelled: false })]
    for (const { id } of [first, second]) await posted(firm.technician.client, [{ ...eventOf(id, 'labelled'), details: { code: codes[0] } }])
    for (const { id } of [first, second]) {
      const { findings } = await cylinderNow(firm.technician.client, id)
      expect(findings).toContainEqual(expect.objectContaining({ code: 'code-on-two', severity: 'stop' }))
    }
    expect((await cylinderNow(firm.technician.client, codes[0]!)).id).toBe(first.id)
  })
})

describe('a label that was replaced', () => {
  it('still opens its cylinder, which names the right one, and is printed no more', async () => {
    const before = await registered(firm)
    const { codes } = await made<MintAnswer>(firm.warehouse.client, '/api/labels', { count: 1 })
    await posted(firm.warehouse.client, [{ ...eventOf(before.id, 'labelled'), details: { code: codes[0], replaces: before.labelCode, reason: 'torn' } }])
    expect(await cylinderNow(firm.technician.client, before.labelCode!)).toMatchObject({ id: before.id, labelCode: codes[0], oldLabelCodes: [before.labelCode] })
    const again = await firm.warehouse.client.get<ProblemDetails>(`/api/labels.pdf?codes=${before.labelCode}`)
    expect(again.status).toBe(409)
    expect(again.body.detail).toContain(`was replaced by ${formatLabelCode(codes[0]!)}`)
    expect((await printed(firm.warehouse, `codes=${codes[0]}`)).pages).toHaveLength(2)
  })
})

describe('where labels lead', () => {
  it('is told to whoever prints them, with what the length of the host makes of them', async () => {
    const { body } = await firm.warehouse.client.get<LabelAddress>('/api/labels/address')
    expect(body).toMatchObject({ publicUrl: server.baseUrl, hostCharacters: new URL(server.baseUrl).host.length, version: 3, isLong: false })
    expect((await firm.technician.client.get('/api/labels/address')).status).toBe(403)
  })
})

describe('the test page', () => {
  it('is a page of the stock\'s size without a symbol', async () => {
    const { pages, headers } = await printed(firm.warehouse, 'stock=roll-3x2', '/api/labels/test-page.pdf')
    expect(headers.get('content-disposition')).toBe('inline; filename="label-test-page.pdf"')
    expect(pages.map(({ width, height }) => [width, height])).toEqual([[216, 144]])
    expect(symbolsOf(pages[0]!)).toEqual([])
    expect((await firm.warehouse.client.get('/api/labels/test-page.pdf?stock=a4')).status).toBe(400)
    expect((await firm.technician.client.get('/api/labels/test-page.pdf')).status).toBe(403)
  })
})
