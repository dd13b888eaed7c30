import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import { eventOf, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'
import { DESK, visit } from '../helpers/visit'

let server: TestServer
let shop: Shop
let browser: Browser
beforeAll(async () => {
  [server, browser] = await Promise.all([startServer(), launchBrowser()])
  shop = await openShop(server)
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

it('a manager begins at what waits, and sees what another records without a touch, the focus where it was', async () => {
  const cylinder = await registered(shop, { gross: lb(64) })
  const context = await visit(browser, shop.manager.client, { viewport: DESK })
  const errors = listenForErrors(context)
  const page = await context.newPage()
  await page.goto(server.baseUrl, { waitUntil: 'networkidle' })
  expect(new URL(page.url()).pathname).toBe('/now')
  const ship = page.getByRole('link', { name: 'Start a shipment: 1 full, ready to ship.' })
  await ship.focus()

  await posted(shop.warehouse.client, [{ ...eventOf(await laterOverfilled(), 'weighed'), details: { gross: lb(68) } }])
  // 68.0 lb gross less 27.5 lb tare is 40.5 lb; 38.08 lb is the limit: 2.42 lb too much, rounded up.
  await page.getByText('1 cylinder is overfilled, by 2.5 lb.').first().waitFor({ timeout: 15_000 })
  expect(await ship.evaluate(link => link === document.activeElement)).toBe(true)
  await page.getByRole('status').filter({ hasText: 'First: 1 cylinder is overfilled' }).waitFor()

  await page.getByRole('link', { name: /^Draw it down: / }).click()
  await page.waitForURL(/\/act\/drawn$/)
  await page.goBack()
  await page.getByRole('link', { name: /^Start a shipment: / }).click()
  await page.waitForURL(url => url.pathname === '/shipments' && url.searchParams.get('with') === cylinder.id)
  expect(errors).toEqual([])
})

async function laterOverfilled(): Promise<string> {
  return (await registered(shop, { gross: lb(50) })).id
}
