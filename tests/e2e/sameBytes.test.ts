import fc from 'fast-check'
import type { Browser, Page } from 'playwright-core'
import { build, type Rollup } from 'vite'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { DEFAULT_FILL_POLICY, type Stamp } from '../../utils/capacity/types'
import { massText, type MassReading } from '../../utils/quantity/mass'
import { CATALOGUE } from '../../utils/refrigerant/allRefrigerants'
import { launchBrowser } from '../helpers/browser'
import { anyCondition, anyStamp, readingAtDivision } from '../helpers/capacityArbitraries'
import * as inNode from '../helpers/capacityBytes'
import { setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'

// The limit that a phone shows without a signal and the one that the server answers must not differ in the last digit: a
// weight would be full here and overfilled there. The same sources run here in Node, minified in a browser, and on the
// built server.

const SEED = 1131
const QUERIES = fc.sample(fc.record({
  stamp: anyStamp,
  refrigerant: fc.constantFrom(...CATALOGUE.refrigerants.keys(), ...CATALOGUE.compositions.keys()),
  condition: anyCondition,
  gross: fc.option(readingAtDivision(1, 2500), { nil: undefined }),
  share: fc.option(fc.integer({ min: 10, max: 800 }), { nil: undefined }),
}), { seed: SEED, numRuns: 400 }).map(({ stamp, gross, share, ...named }) => queryOf(stamp, { ...named, gross, share }))

type Asked = { refrigerant: string, condition: string, gross: MassReading | undefined, share: number | undefined }

function queryOf(stamp: Stamp, { refrigerant, condition, gross, share }: Asked): Record<string, string> {
  return {
    refrigerant,
    condition,
    waterCapacity: massText(stamp.waterCapacity!),
    tareWeight: massText(stamp.tareWeight!),
    spec: stamp.spec,
    servicePressurePsig: String(stamp.servicePressurePsig),
    flammableMarked: String(stamp.flammableMarked),
    ...(gross ? { gross: massText(gross) } : {}),
    ...(share ? { share: String(share / 1000) } : {}),
  }
}

let server: TestServer
let admin: Member
let browser: Browser
let page: Page

beforeAll(async () => {
  let script: string;
  [server, browser, script] = await Promise.all([startServer(), launchBrowser(), bundled()])
  admin = await setUpFirm(server)
  page = await browser.newPage()
  await page.addScriptTag({ content: script })
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

/** The modules as a browser gets them: in one script, minified. */
async function bundled(): Promise<string> {
  const built = await build({
    configFile: false,
    logLevel: 'error',
    resolve: { alias: { '~~': process.cwd() } },
    build: { write: false, minify: true, lib: { entry: 'tests/helpers/capacityBytes.ts', formats: ['iife'], name: 'capacityBytes' } },
  })
  const [{ output }] = built as Rollup.RollupOutput[] as [Rollup.RollupOutput]
  return output[0].code
}

/** What the server sends, as it comes over the wire. */
async function wireBytes(query: Record<string, string>): Promise<string> {
  const cookie = [...admin.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
  const response = await fetch(`${server.baseUrl}/api/fill-limit?${new URLSearchParams(query)}`, { headers: { cookie, 'sec-fetch-site': 'same-origin' } })
  if (response.status !== 200) throw new Error(`${response.status} for ${JSON.stringify(query)}: ${await response.text()}`)
  return response.text()
}

type InBrowser = { capacityBytes: typeof inNode }

/** The first few places at which two lists of answers differ: both texts from the first differing character on. */
function differences(found: string[], expected: string[]): { at: number, found: string, expected: string }[] {
  const places = Array.from({ length: Math.max(found.length, expected.length) }, (_, at) => at).filter(at => found[at] !== expected[at])
  return places.slice(0, 3).map((at) => {
    const [one = '', other = ''] = [found[at], expected[at]]
    const from = Array.from(`${other} `).findIndex((character, index) => character !== one[index])
    return { at, found: one.slice(from, from + 80), expected: other.slice(from, from + 80) }
  })
}

describe('the same question', () => {
  const expected = inNode.fillLimitBytes(QUERIES, DEFAULT_FILL_POLICY)

  it('is asked of many stamps, of which most have a limit', () => {
    expect(new Set(QUERIES.map(query => query.refrigerant)).size).toBeGreaterThan(70)
    expect(expected.filter(text => !text.includes('"fillLimitGrams":null')).length).toBeGreaterThan(150)
  })

  it('has the same fill limit, terms and room to the last byte in a browser', async () => {
    const shown = await page.evaluate(
      ([queries, policy]) => (window as unknown as InBrowser).capacityBytes.fillLimitBytes(queries, policy),
      [QUERIES, DEFAULT_FILL_POLICY] as const,
    )
    expect(differences(shown, expected)).toEqual([])
  })

  it('has the same to the last byte over HTTP', async () => {
    const answered: string[] = []
    for (let at = 0; at < QUERIES.length; at += 20) answered.push(...await Promise.all(QUERIES.slice(at, at + 20).map(wireBytes)))
    expect(differences(answered, expected)).toEqual([])
  })

  it('has the same densities and pressures between the rows of every table, and the same cylinder as it warms', async () => {
    const shown = await page.evaluate(() => (window as unknown as InBrowser).capacityBytes.propertyBytes())
    expect(differences(shown, inNode.propertyBytes())).toEqual([])
  })
})
