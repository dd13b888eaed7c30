import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { FleetAnswer } from '../../utils/contract/custody'
import type { Place } from '../../utils/contract/places'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import type { TestClient } from '../helpers/client'
import { eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { handScanner } from '../helpers/handScanner'
import { startServer, type TestServer } from '../helpers/server'
import { visit } from '../helpers/visit'

let server: TestServer
let shop: Shop
let van: Place
let browser: Browser

beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  van = await made<Place>(shop.admin.client, '/api/places', { name: 'Van 3', kind: 'van', technicianId: shop.technician.id })
  browser = await launchBrowser()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function onPage(client: TestClient, path: string): Promise<{ page: Page, said: string[], close: () => Promise<void> }> {
  const context = await visit(browser, client)
  const said = listenForErrors(context)
  const page = await context.newPage()
  await page.goto(`${server.baseUrl}${path}`, { waitUntil: 'networkidle' })
  return { page, said, close: () => context.close() }
}

async function atPlace(place: Place): Promise<string[]> {
  return (await shop.manager.client.get<FleetAnswer>(`/api/cylinders?place=${place.id}&limit=200`)).body.items.map(({ id }) => id).sort()
}

describe('a van that returns', () => {
  let aboard: CylinderView[]

  beforeAll(async () => {
    const four = await Promise.all(Array.from({ length: 4 }, () => registered(shop)))
    aboard = await posted(shop.technician.client, four.map(({ id }) => ({ ...eventOf(id, 'moved'), details: { toPlaceId: van.id, toHolderId: shop.technician.id } })))
  })

  it('is checked against what it should hold: the missing one is named with its last holder, and stays to be looked for', async () => {
    const { page, said, close } = await onPage(shop.warehouse.client, `/vans/${van.id}/check-in`)
    const scanner = await handScanner(page)
    await page.getByText('Expected 4: 0 scanned, 4 missing').waitFor()
    const stranger = await registered(shop)
    const [lost, stays, ...back] = aboard
    for (const view of [stays!, ...back]) {
      await scanner.scan(`${server.baseUrl}/C/${view.labelCode}`.toUpperCase(), { enter: true })
      await page.getByRole('button', { name: `Take ${formatLabelCode(view.labelCode!)} off the list` }).waitFor()
    }
    await scanner.scan(`${server.baseUrl}/C/${stranger.labelCode}`.toUpperCase(), { enter: true })
    await page.getByText('It is at North shop already.').first().waitFor()

    await page.getByText('Expected 4: 3 scanned, 1 missing').waitFor()
    const missing = page.getByRole('list', { name: 'Missing' })
    expect(await missing.innerText()).toContain(formatLabelCode(lost!.labelCode!))
    expect(await missing.innerText()).toContain('last held by Tina')
    expect(await missing.innerText()).toMatch(/last seen .+: moved/)

    await page.getByLabel(`${formatLabelCode(stays!.labelCode!)} stays aboard`).check()
    await page.getByRole('button', { name: 'Check in without 1' }).click()
    await page.getByText('Van 3 is checked in').waitFor()
    expect(await page.evaluate(() => document.activeElement!.id)).toBe('main')
    // The stranger was at the shop already and did not come with the van.
    await page.getByText('2 to North shop, 1 stays aboard, 1 not found.').waitFor()
    const cameOff = page.locator('dl').getByText('To North shop').locator('xpath=following-sibling::dd')
    expect((await cameOff.innerText()).split(', ').sort()).toEqual(back.map(view => formatLabelCode(view.labelCode!)).sort())
    expect(await page.getByRole('list', { name: 'Missing' }).innerText()).toContain('last held by Tina')
    expect(await atPlace(van)).toEqual([lost!.id, stays!.id].sort())
    expect(await atPlace(shop.shop)).toEqual(expect.arrayContaining(back.map(({ id }) => id)))
    expect(said).toEqual([])
    await close()

    const manager = await onPage(shop.manager.client, '/vans')
    const lookFor = manager.page.getByRole('region', { name: 'To look for' })
    expect(await lookFor.innerText()).toContain(formatLabelCode(lost!.labelCode!))
    expect(await lookFor.innerText()).toContain('last with Tina')
    expect(await lookFor.innerText()).not.toContain(formatLabelCode(stays!.labelCode!))
    await manager.close()
  })

  it('says which cylinder takes 9 lb, asked with the keyboard, by an address that can be sent on', async () => {
    const { page, said, close } = await onPage(shop.technician.client, `/which-cylinder?van=${van.id}`)
    await page.getByLabel('How much, pounds').fill('9')
    await page.getByLabel('Refrigerant', { exact: true }).selectOption('R-22')
    await page.getByRole('button', { name: 'Show which cylinder' }).press('Enter')
    await page.getByRole('region', { name: 'Takes all of it' }).getByText('holds R-22').first().waitFor()
    expect(new URL(page.url()).searchParams.get('amount')).toBe('9lb')
    expect(said).toEqual([])
    await close()
  })
})
