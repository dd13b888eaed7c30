import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CustodyLogAnswer } from '../../utils/contract/custody'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import { cylinderNow, openShop, registered, type Shop } from '../helpers/fleet'
import { handScanner } from '../helpers/handScanner'
import { startServer, type TestServer } from '../helpers/server'
import { visit } from '../helpers/visit'

let server: TestServer
let shop: Shop
let browser: Browser

beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  browser = await launchBrowser()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

describe('a transfer by two scans', () => {
  it('is recorded on both cylinders at once, shown to balance before, and each log names the other', async () => {
    const [from, into] = [await registered(shop), await registered(shop, { contents: 'evacuated' })]

    const context = await visit(browser, shop.technician.client)
    const said = listenForErrors(context)
    const page = await context.newPage()
    await page.goto(`${server.baseUrl}/scan`, { waitUntil: 'networkidle' })
    const scanner = await handScanner(page)
    const address = (code: string) => `${server.baseUrl}/C/${code}`.toUpperCase()
    await scanner.scan(address(from.labelCode!), { enter: true })
    await page.getByText(formatLabelCode(from.labelCode!)).first().waitFor()
    await page.goto(`${server.baseUrl}/c/${from.labelCode!.toLowerCase()}/act/transferred`, { waitUntil: 'networkidle' })
    await scanner.scan(address(into.labelCode!), { enter: true })
    await page.getByRole('region', { name: `Into ${formatLabelCode(into.labelCode!)}` }).getByText('Stop at').waitFor()

    const weights = { 'Out of it: scale before': '40', 'Into it: scale before': '27.5', 'Out of it: scale after': '30', 'Into it: scale after': '37.4' }
    for (const [name, text] of Object.entries(weights)) await page.getByRole('group', { name }).getByRole('textbox').first().fill(text)
    await page.getByText('within the scales').waitFor()
    await page.getByRole('button', { name: 'Record the transfer' }).click()
    await page.getByText('Recorded: transferred', { exact: true }).first().waitFor()

    // 40.0 less 30.0 lb went out, 37.4 less 27.5 lb came in: 4,536 g and 4,490 g by readings in whole grams.
    expect((await cylinderNow(shop.manager.client, from.id)).contents.netGrams).toBe(1134)
    expect((await cylinderNow(shop.manager.client, into.id)).contents).toMatchObject({ refrigerant: 'R-22', netGrams: 4490 })
    const log = (await shop.manager.client.get<CustodyLogAnswer>(`/api/cylinders/${into.id}/events`)).body
    expect(log.items[0]).toMatchObject({ kind: 'transferred', otherCylinder: { labelCode: from.labelCode } })
    await page.goto(`${server.baseUrl}/c/${into.labelCode!.toLowerCase()}/log`, { waitUntil: 'networkidle' })
    await page.getByRole('link', { name: `out of ${formatLabelCode(from.labelCode!)}` }).first().waitFor()

    // What both halves say wrong is mended in both at once, each keeping its weights.
    await page.goto(`${server.baseUrl}/c/${into.labelCode!.toLowerCase()}/act/corrected?event=${log.items[0]!.id}`, { waitUntil: 'networkidle' })
    const both = page.getByRole('checkbox', { name: 'Correct the other half as well' })
    expect(await both.count()).toBe(0)
    await page.getByRole('combobox', { name: 'Refrigerant that went over' }).selectOption('R-407C')
    await both.waitFor()
    expect(await both.isChecked()).toBe(true)
    await page.getByRole('textbox', { name: 'Why' }).fill('The tag says R-407C')
    await page.getByRole('button', { name: 'Record the correction' }).click()
    await page.getByText('Recorded: corrected, on both cylinders').first().waitFor()
    for (const [{ id }, after] of [[from, 30], [into, 37.4]] as const) {
      const { items } = (await shop.manager.client.get<CustodyLogAnswer>(`/api/cylinders/${id}/events`)).body
      expect(items.find(({ kind }) => kind === 'transferred')!.instead).toMatchObject({ refrigerant: 'R-407C', grossAfter: { value: after } })
    }
    expect(said).toEqual([])
    await context.close()
  })
})
