import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { FleetAnswer } from '../../utils/contract/custody'
import type { Place } from '../../utils/contract/places'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import { filmOfLabelPdf } from '../helpers/fakeCamera'
import type { Member } from '../helpers/firm'
import { made, openShop, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'

const PHONE = { width: 412, height: 915 }
const DESK = { width: 1440, height: 900 }

let server: TestServer
let shop: Shop
let van: Place
let folder: string
let browser: Browser
let camera: Browser | undefined
const errors: string[][] = []
const asked = new Set<string>()

/** What the warehouse's step leaves for the others. */
let code: string

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'collarbook-film-'))
  server = await startServer()
  shop = await openShop(server)
  van = await made<Place>(shop.admin.client, '/api/places', { name: 'Van 12', kind: 'van', technicianId: shop.technician.id })
  browser = await launchBrowser()
})
afterAll(async () => {
  await Promise.all([browser?.close(), camera?.close()])
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

async function signedIn(on: Browser, member: Member, viewport: typeof PHONE): Promise<{ page: Page, context: BrowserContext }> {
  const context = await on.newContext({ viewport, permissions: ['camera'], timezoneId: 'America/Chicago', serviceWorkers: 'block' })
  errors.push(listenForErrors(context))
  context.on('request', request => asked.add(new URL(request.url()).origin))
  const page = await context.newPage()
  await page.goto(`${server.baseUrl}/sign-in`, { waitUntil: 'networkidle' })
  await page.getByLabel('Email address').fill(member.email)
  await page.getByLabel('Password', { exact: true }).fill(member.password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(url => url.pathname !== '/sign-in')
  return { page, context }
}

async function weightIn(page: Page, label: string, pounds: number, ounces?: number): Promise<void> {
  await page.getByLabel(`${label}, pounds`).fill(String(pounds))
  if (ounces !== undefined) await page.getByLabel(`${label}, ounces`).fill(String(ounces))
}

/** The cylinder page's record of an act, and back to the page of the cylinder. */
async function recordMove(page: Page, choice: RegExp): Promise<void> {
  await page.getByRole('link', { name: /^(Move|Move it)$/ }).first().click()
  await page.getByRole('button', { name: choice }).click()
  await page.getByRole('button', { name: /^Record/ }).click()
  await page.getByRole('link', { name: 'The cylinder' }).last().click()
}

describe('a cylinder from its label to the auditor', () => {
  it('the warehouse registers and labels it, and prints the label', async () => {
    const { page, context } = await signedIn(browser, shop.warehouse, DESK)
    await page.goto(`${server.baseUrl}/fleet/register`, { waitUntil: 'networkidle' })
    await page.getByLabel('Specification and service pressure').fill('DOT-4BA400')
    await page.getByLabel('Serial', { exact: true }).fill('K48213')
    await weightIn(page, 'Tare weight, TW', 27.5)
    await weightIn(page, 'Water capacity, WC', 47.6)
    await page.getByLabel('Made').fill('03-21')
    await page.getByLabel('Test mark 1, the mark, or its month and year').fill('04-25')
    await page.getByRole('group', { name: 'Marked for flammables', exact: true }).getByRole('button', { name: 'no', exact: true }).click()
    await page.getByRole('group', { name: 'What is in it', exact: true }).getByRole('button', { name: /evacuated/ }).click()
    await weightIn(page, 'On the scale now', 27.5)
    await page.getByLabel('Where it stands').selectOption({ label: 'North shop' })
    await page.getByRole('button', { name: 'Register K48213' }).click()
    await page.getByRole('link', { name: 'Print the label' }).waitFor()

    const { items } = (await shop.warehouse.client.get<FleetAnswer>('/api/cylinders?q=K48213')).body
    code = items[0]!.labelCode!
    expect(items[0]).toMatchObject({ serial: 'K48213', lifecycle: 'in-service', nothingInIt: true })
    await page.getByText(formatLabelCode(code)).first().waitFor()

    const pdf = await page.request.get(`${server.baseUrl}/api/labels.pdf?codes=${code}&stock=roll-4x2`)
    expect(pdf.headers()['content-type']).toBe('application/pdf')
    filmOfLabelPdf(await pdf.body(), join(folder, 'label.y4m'))
    await context.close()
  })

  it('the technician\'s camera reads the printed label, and the page says when to stop', async () => {
    camera = await launchBrowser({ cameraFilm: join(folder, 'label.y4m') })
    const { page } = await signedIn(camera, shop.technician, PHONE)
    await page.goto(`${server.baseUrl}/scan`)
    await page.getByRole('region', { name: `Cylinder ${formatLabelCode(code)}` }).waitFor({ timeout: 30_000 })
    await page.goto(`${server.baseUrl}/c/${code}?refrigerant=R-22`, { waitUntil: 'networkidle' })
    // 0.80 x 47.6 lb = 38.08 lb; with the tare of 27.5 lb 65.58 lb, shown rounded down.
    await page.getByText('Stop when the scale reads').waitFor()
    expect(await page.locator('main').innerText()).toMatch(/65\.5\s*lb/)
  })

  it('the technician fills it by a reading in pounds and ounces, takes it onto the van and brings it back', async () => {
    const { page } = await signedIn(camera!, shop.technician, PHONE)
    await page.goto(`${server.baseUrl}/c/${code}/act/filled?refrigerant=R-22`, { waitUntil: 'networkidle' })
    await page.getByLabel('Looked at it: sound').check()
    await page.getByLabel('Refrigerant that went in').selectOption('R-22')
    const unit = page.getByRole('group', { name: 'Unit of the scale' }).first()
    await unit.getByRole('button', { name: 'lb oz' }).click()
    await weightIn(page, 'Scale before', 27, 8)
    await weightIn(page, 'Scale after', 41, 13)
    await page.getByRole('button', { name: 'Record the recovery' }).click()
    await page.getByRole('link', { name: 'The cylinder' }).last().click()
    await page.getByText('Stop when the scale reads').waitFor()
    await recordMove(page, /Take onto my van, Van 12/)
    await page.getByText('Van 12').first().waitFor()
    await recordMove(page, /Bring to North shop/)
    await page.getByText('North shop').first().waitFor()
    await expect.poll(async () => (await shop.technician.client.get<FleetAnswer>(`/api/cylinders?label=${code}`)).body.items[0])
      .toMatchObject({ refrigerant: 'R-22', netGrams: 6492, place: { name: 'North shop' }, holder: null })
  })

  it('the manager ships it for reclaim from the fleet', async () => {
    const { page, context } = await signedIn(browser, shop.manager, DESK)
    await page.goto(`${server.baseUrl}/fleet`, { waitUntil: 'networkidle' })
    await page.getByRole('checkbox', { name: new RegExp(formatLabelCode(code)) }).check()
    await page.getByRole('link', { name: 'Prepare a shipment with this' }).or(page.getByRole('button', { name: /Prepare a shipment with/ })).first().click()
    await page.getByLabel('To the reclaimer').selectOption({ label: shop.reclaimer.name })
    await page.getByRole('button', { name: 'Make the draft' }).click()
    await page.waitForURL(/\/shipments\/[0-9a-f-]{36}$/)
    await page.getByLabel('Carried by').selectOption({ label: 'Our own vehicle' })
    await page.getByRole('link', { name: 'Scan and weigh' }).click()
    await page.waitForURL(/\/weigh$/, { waitUntil: 'networkidle' })
    const typing = page.getByRole('button', { name: 'Type the code or the serial' })
    if (await typing.isVisible()) await typing.click()
    await page.getByLabel('Nine characters of the label').fill(code)
    await page.getByLabel('The scale shows, pounds').fill('41.8')
    await page.getByRole('button', { name: 'Keep 41.8' }).click()
    await page.getByRole('link', { name: 'All are weighed: on to the shipment' }).click()
    await page.getByRole('button', { name: 'It is ready' }).click()
    await page.getByRole('button', { name: 'Dispatch 1 cylinder' }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Ship 1 cylinder' }).click()
    await page.getByText('Print this list').waitFor()
    await context.close()
  })

  it('the auditor reads the whole story, and verifies the log', async () => {
    const { page, context } = await signedIn(browser, shop.auditor, DESK)
    await page.goto(`${server.baseUrl}/c/${code}/log`, { waitUntil: 'networkidle' })
    const lines = page.locator('table tbody tr').filter({ has: page.getByRole('cell') })
    const texts = (await lines.allInnerTexts()).map(text => text.replace(/\s+/g, ' '))
    const told = ['Sent for reclaim', 'Moved', 'Moved', 'Filled', 'Labelled', 'Registered']
    expect(texts).toHaveLength(told.length)
    for (const [index, word] of told.entries()) expect(texts[index]).toContain(word)
    expect(texts[0]).toMatch(/Mona.*41\.8/)
    expect(texts[2]).toContain(van.name)
    expect(texts[3]).toMatch(/Tina.*41 lb 13 oz/)
    expect(texts[5]).toContain('Wes')
    // Both times of each line: as it occurred and as it was recorded.
    for (const text of texts) expect(text.match(/\d{1,2}:\d\d/g)?.length).toBeGreaterThanOrEqual(2)

    await page.goto(`${server.baseUrl}/log`, { waitUntil: 'networkidle' })
    await page.getByRole('button', { name: 'Verify all' }).click()
    await page.getByText(/Checked 6 events/).first().waitFor()
    const verdict = await shop.auditor.client.get('/api/log/verify')
    expect(verdict.body).toMatchObject({ ok: true, checked: 6, cylinders: 1 })
    await context.close()
  })

  it('says nothing of errors on any page on the way', () => {
    expect(errors.length).toBeGreaterThan(0)
    expect(errors.flat()).toEqual([])
  })

  it('asks nobody on the way but this server', () => {
    expect([...asked]).toEqual([server.baseUrl])
  })
})
