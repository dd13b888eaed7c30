import { request } from 'node:http'
import { brotliDecompressSync, gunzipSync, gzipSync } from 'node:zlib'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser } from '../helpers/browser'
import { openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { visit } from '../helpers/visit'

/** The most that a phone downloads to show a cylinder, in bytes of compressed script. */
const MOST = 140_000
/** What only the decoder of symbols, and only the catalogue of refrigerants, have in them. */
const [OF_DECODER, OF_CATALOGUE] = [/zxing/i, /R-1234ze\(E\)[\s\S]*R-515B/]

interface Script { path: string, text: string, transferred: number }

let server: TestServer
let shop: Shop
let browser: Browser
let code: string

beforeAll(async () => {
  [server, browser] = await Promise.all([startServer(), launchBrowser()])
  shop = await openShop(server)
  code = (await registered(shop)).labelCode!.toLowerCase()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

/** A person's page, a technician's unless told otherwise, and the scripts that it has downloaded by the time it is looked at. */
async function weighed(path: string, client = shop.technician.client): Promise<{ page: Page, scripts: () => Promise<Script[]> }> {
  const context = await visit(browser, client)
  const page = await context.newPage()
  const loading: Promise<Script>[] = []
  page.on('requestfinished', (request) => {
    const { pathname } = new URL(request.url())
    if (!/\.(m?js|wasm)$/.test(pathname)) return
    loading.push(request.response().then(async (response) => {
      const [body, { responseBodySize }] = [await response!.body(), await request.sizes()]
      return { path: pathname, text: body.toString('latin1'), transferred: responseBodySize }
    }))
  })
  await page.goto(`${server.baseUrl}${path}`, { waitUntil: 'networkidle' })
  return { page, scripts: () => Promise.all(loading) }
}

/** Bytes of script on the wire. */
function transferred(scripts: Script[]): number {
  return scripts.reduce((sum, script) => sum + script.transferred, 0)
}

describe('what a phone downloads to show a cylinder', () => {
  it.each(['technician', 'manager'] as const)('is at most 140 kB of compressed script for a %s, and neither the decoder nor the catalogue', async (role) => {
    const { page, scripts } = await weighed(`/c/${code}`, shop[role].client)
    await page.getByText('Stop when the scale reads').waitFor()
    const found = await scripts()
    const gzipped = found.reduce((sum, script) => sum + gzipSync(Buffer.from(script.text, 'latin1')).length, 0)
    console.log(`The cylinder page of a ${role}: ${found.length} scripts, ${transferred(found)} bytes as sent, ${gzipped} bytes as gzip`)
    expect(found.length).toBeGreaterThan(0)
    expect(gzipped).toBeLessThanOrEqual(MOST)
    expect(transferred(found)).toBeLessThanOrEqual(MOST)
    expect(found.filter(script => OF_DECODER.test(script.text)).map(script => script.path)).toEqual([])
    expect(found.filter(script => OF_CATALOGUE.test(script.text)).map(script => script.path)).toEqual([])
    await page.context().close()
  })

  it('has the catalogue once for all its forms, from the first one on that judges an entry', async () => {
    const { page, scripts } = await weighed(`/c/${code}/act/filled`)
    const catalogues = async () => (await scripts()).filter(script => OF_CATALOGUE.test(script.text)).map(script => script.path)
    await page.getByLabel('Looked at it: sound').check()
    await page.getByLabel('Scale before, pounds').fill('40')
    await page.getByLabel('Scale after, pounds').fill('45')
    await expect.poll(catalogues).toHaveLength(1)
    await page.getByRole('link', { name: 'The cylinder' }).click()
    await page.getByRole('link', { name: /^Weigh/ }).first().click()
    await page.getByLabel('The scale shows, pounds').fill('20')
    await page.getByText('Record it anyway: it happened').waitFor()
    expect(await catalogues()).toHaveLength(1)
    expect((await scripts()).filter(script => OF_DECODER.test(script.text))).toEqual([])
    await page.context().close()
  })

  it('has the decoder on the scan screen, from this server', async () => {
    const { page, scripts } = await weighed('/scan')
    await expect.poll(async () => (await scripts()).filter(script => OF_DECODER.test(script.text)).length).toBeGreaterThan(0)
    await page.context().close()
  })
})

describe('a script as it is sent', () => {
  it.each([
    ['br', (body: Buffer) => brotliDecompressSync(body)],
    ['gzip', (body: Buffer) => gunzipSync(body)],
  ])('is compressed by %s to whoever takes it, and kept for good', async (encoding, open) => {
    const html = await (await fetch(`${server.baseUrl}/sign-in`)).text()
    const path = /\/_nuxt\/[\w-]+\.js/.exec(html)?.[0] ?? ''
    const answer = await new Promise<{ headers: Record<string, string | string[] | undefined>, body: Buffer }>((done, failed) => {
      request(`${server.baseUrl}${path}`, { headers: { 'accept-encoding': encoding } }, (response) => {
        const parts: Buffer[] = []
        response.on('data', part => parts.push(part))
        response.on('end', () => done({ headers: response.headers, body: Buffer.concat(parts) }))
      }).on('error', failed).end()
    })
    expect(answer.headers).toMatchObject({ 'content-encoding': encoding, 'cache-control': expect.stringContaining('immutable'), 'vary': expect.stringMatching(/accept-encoding/i) })
    expect(open(answer.body).length).toBeGreaterThan(answer.body.length)
  })
})
