import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CylinderView } from '../../utils/custody/cylinderView'
import type { TestClient } from '../helpers/client'
import { openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'

const BROWSER = { 'accept': 'text/html', 'sec-fetch-site': 'none', 'sec-fetch-mode': 'navigate' }

let server: TestServer
let shop: Shop
let cylinder: CylinderView
let empty: CylinderView

beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  cylinder = await registered(shop)
  empty = await registered(shop, { contents: 'evacuated', gross: undefined })
})
afterAll(() => server?.stop())

/** The words of a page as they first arrive, before any script has run. */
async function wordsOf(client: TestClient, path: string): Promise<string> {
  const { status, body } = await client.get<string>(path, BROWSER)
  expect(status).toBe(200)
  return body.replace(/<(script|style)\b[\s\S]*?<\/\1>/g, ' ').replace(/<[^>]+>/g, ' ').replaceAll('&nbsp;', ' ').replace(/\s+/g, ' ')
}

/** Every value that stands in a field of a page. */
async function valuesOf(client: TestClient, path: string): Promise<string[]> {
  const { body } = await client.get<string>(path, BROWSER)
  return [...body.matchAll(/<input\b[^>]*\bvalue="([^"]*)"/g)].map(match => match[1]!)
}

describe('the first HTML of a cylinder', () => {
  it('says how full it is at 131 F, at the desk and in the field: 5,670 g of R-22 in 21.61 L are 262 g a litre, of 1,057 and 97', async () => {
    for (const person of [shop.technician, shop.manager]) {
      expect(await wordsOf(person.client, `/c/${cylinder.labelCode!.toLowerCase()}`)).toMatch(/At 131 °F it is 17.% full/)
    }
  })

  it('says it of a fill to the limit where nothing is in it, and leads to the sum of the refrigerant asked about', async () => {
    const path = `/c/${empty.labelCode!.toLowerCase()}`
    expect(await wordsOf(shop.technician.client, `${path}?refrigerant=R-410A`)).toMatch(/Filled to the limit, at 131 °F it is 91.% full/)
    const { body } = await shop.technician.client.get<string>(`${path}?refrigerant=R-410A`, BROWSER)
    expect(body.includes(`href="${path}/working?refrigerant=R-410A"`)).toBe(true)
    expect(await wordsOf(shop.technician.client, path)).not.toContain('At 131 °F')
  })
})

describe('how a cylinder is worked out', () => {
  it('stands in the first HTML: the sum, each rule with its factors, whose stamp it is and whose word counts', async () => {
    const words = await wordsOf(shop.technician.client, `/c/${empty.id}/working?refrigerant=R-410A`)
    // WC 47.6 lb: 0.80 of it is 38.08 lb.
    expect(words).toMatch(/governs 38\.0.lb/)
    expect(words).toMatch(/Scale reads .* less tare weight .* Net .* Fill limit .* Room .* Stop weight/)
    expect(words).toMatch(/liquid at 77 °F above our margin/)
    expect(words).toContain('not in force: option off')
    expect(words).toContain('not in force: only when burnt')
    expect(words).toContain('the table does not name R-410A')
    expect(words).toMatch(/Stamp read .* by /)
    expect(words).toContain('The product computes; it does not license.')
  })

  it('says of an empty cylinder that the refrigerant is still to be chosen', async () => {
    const words = await wordsOf(shop.technician.client, `/c/${empty.id}/working`)
    expect(words).toContain('by refrigerant')
    expect(words).toContain('Choose the refrigerant that is to go in.')
  })

  it('is a page of a cylinder that exists, for whoever is signed in', async () => {
    expect((await shop.technician.client.get('/c/00000000-0000-7000-8000-000000000000/working', BROWSER)).status).toBe(404)
    expect((await shop.technician.client.get('/c/00000000-0000-7000-8000-000000000000/working', { ...BROWSER, cookie: '' })).status).not.toBe(200)
  })
})

describe('the comparison of the fill rules', () => {
  const STAMP = 'waterCapacity=47.7lb&tareWeight=27.9lb&spec=DOT-4BA400'

  it('is worked out from its address alone: 0.80 x 47.7 is 38.16, and 27.9 more is 66.0 down', async () => {
    const words = await wordsOf(shop.technician.client, `/fill-limit?refrigerant=R-410A&${STAMP}&gross=50.5lb`)
    expect(words).toMatch(/Fill limit, net 38\.1 .?lb/)
    expect(words).toMatch(/Stop weight 66\.0 .?lb/)
    expect(words).toMatch(/Room 15\.5 .?lb/)
    expect(words).toContain('liquid-full at 131 °F, from 41.3 lb net')
    expect(words).toContain('What it could take, by this stamp')
  })

  it('gives no figure of a rule that would overfill, and names what speaks against the stamp', async () => {
    const words = await wordsOf(shop.manager.client, `/fill-limit?refrigerant=R-290&${STAMP}`)
    expect(words).toContain('unsafe for this refrigerant')
    expect(words).not.toContain('38.16')
    expect(words).toMatch(/Do not fill: .*not marked/i)
  })

  it('takes a composition in place of a name', async () => {
    const words = await wordsOf(shop.manager.client, `/fill-limit?composition=R-32:50,R-125:50&${STAMP}`)
    expect(words).toContain('taken off for the estimate')
    expect(words).toMatch(/Do not fill: not rated for its pressure/)
    expect(words).toMatch(/No pressure is known for R-32\/R-125 \(50\/50\)/)
  })

  it('says beside each field what cannot be read, and keeps all that was typed', async () => {
    const path = '/fill-limit?refrigerant=R-22&waterCapacity=fortyseven&spec=DOT-9X&servicePressurePsig=abc&share=0.9&gross=1%2C022'
    const words = await wordsOf(shop.technician.client, path)
    expect(words).toContain('This cannot be worked out yet')
    for (const error of ['Must be a mass such as', 'Must be a specification such as', 'Must be a figure in psig', 'Must be at most 0.80']) expect(words).toContain(error)
    expect(await valuesOf(shop.technician.client, path)).toEqual(expect.arrayContaining(['fortyseven', 'DOT-9X', 'abc', '0.9', '1,022']))
  })

  it('asks for what is missing, and explains itself where nothing is asked', async () => {
    expect(await wordsOf(shop.technician.client, '/fill-limit?refrigerant=R-22')).toContain('Needed: every rule is reckoned from it.')
    expect(await wordsOf(shop.technician.client, '/fill-limit')).toContain('Nothing is compared yet.')
  })
})
