import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ProblemDetails } from '../../utils/contract/problem'
import type { ContentsTagAnswer } from '../../utils/document/contentsTag'
import { eventOf, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { drawnPages, symbolsOf } from '../helpers/pdfShapes'
import { symbolTexts } from '../helpers/printedPage'
import { lb } from '../helpers/stamps'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let firm: Shop
beforeAll(async () => {
  server = await startServer()
  firm = await openShop(server)
})
afterAll(() => server.stop())

async function filledWith(refrigerant: string) {
  const { id } = await registered(firm, { contents: 'evacuated' })
  const [view] = await posted(firm.technician.client, [{
    ...eventOf(id, 'filled'), details: { refrigerant, condition: 'clean', grossBefore: lb(27.5), grossAfter: lb(41.5), looked: true },
  }])
  return view!
}

describe('the contents tag of a cylinder', () => {
  it('says what was recovered, how much, when and by whom, and how it travels', async () => {
    const { id } = await filledWith('R-22')
    const { status, body } = await firm.technician.client.get<ContentsTagAnswer>(`/api/cylinders/${id}/contents-tag`)
    expect(status).toBe(200)
    // 41.5 lb less the tare of 27.5 lb.
    expect(body.tag).toMatchObject({
      refrigerant: 'R-22', kind: 'Recovered', net: '14.0\u00A0lb (6.35\u00A0kg)', technician: 'Tina', numberHeightMm: 6,
      entry: { un: 'UN1018', properShippingName: 'Refrigerant gas R 22', judgement: null },
    })
  })

  it('leaves the choice of an n.o.s. entry to the shipper\'s judgement, and says so', async () => {
    const { id } = await filledWith('R-410A')
    const { body } = await firm.auditor.client.get<ContentsTagAnswer>(`/api/cylinders/${id}/contents-tag`)
    expect(body.tag?.entry.judgement).toContain('the shipper classifies it')
  })

  it.each([['roll-4x2', 288, 144], ['roll-4x6', 288, 432], ['letter-6', 612, 792]] as const)('is printed on %s, with the address of its cylinder in the symbol', async (stock, width, height) => {
    const { id, labelCode } = await filledWith('R-22')
    const cookie = [...firm.technician.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
    const answer = await fetch(`${server.baseUrl}/api/cylinders/${labelCode}/contents-tag.pdf?stock=${stock}`, { headers: { cookie } })
    expect(answer.headers.get('content-disposition')).toBe('inline; filename="contents-tag.pdf"')
    const pages = drawnPages(Buffer.from(await answer.arrayBuffer()))
    expect(pages.map(page => [page.width, page.height])).toEqual([[width, height]])
    expect(symbolsOf(pages[0]!)).toHaveLength(1)
    expect(await symbolTexts(pages[0]!)).toEqual([`${server.baseUrl.toUpperCase()}/C/${labelCode}`])
    expect(id).not.toBe(labelCode)
  })

  it('is refused with words where nothing is in it, or nobody knows what, or there is no code', async () => {
    const cases = [
      [await registered(firm, { contents: 'evacuated' }), 'Nothing is in it'],
      [await registered(firm, { contents: 'unknown', gross: lb(40) }), 'What is in it is not known'],
      [await registered(firm, { isLabelled: false }), 'Label it first'],
    ] as const
    for (const [{ id }, words] of cases) {
      const shown = await firm.technician.client.get<ContentsTagAnswer>(`/api/cylinders/${id}/contents-tag`)
      expect(shown.body).toMatchObject({ tag: null, refusal: expect.stringContaining(words) })
      const printed = await firm.technician.client.get<ProblemDetails>(`/api/cylinders/${id}/contents-tag.pdf`)
      expect(printed.status).toBe(409)
      expect(printed.body.detail).toContain(words)
    }
  })

  it('bears the day of its fill, however much was recorded after it', async () => {
    const { id } = await filledWith('R-22')
    for (const count of [200, 1]) {
      await posted(firm.technician.client, Array.from({ length: count }, () => ({ ...eventOf(id, 'weighed'), details: { gross: lb(41.5) } })))
    }
    const { body } = await firm.technician.client.get<ContentsTagAnswer>(`/api/cylinders/${id}/contents-tag`)
    expect(body.tag).toMatchObject({ refrigerant: 'R-22', kind: 'Recovered', technician: 'Tina' })
  })

  it('is not printed on labels too small for it', async () => {
    const { id } = await filledWith('R-22')
    expect((await firm.technician.client.get(`/api/cylinders/${id}/contents-tag.pdf?stock=roll-2x1`)).status).toBe(400)
    expect((await firm.technician.client.get('/api/cylinders/nobody/contents-tag.pdf')).status).toBe(404)
  })
})
