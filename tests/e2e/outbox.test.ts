import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CustodyLogAnswer } from '../../utils/contract/custody'
import type { Place } from '../../utils/contract/places'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { formatLabelCode } from '../../utils/label/code'
import type { MassReading } from '../../utils/quantity/mass'
import { crash, launchBrowser, launchProfile } from '../helpers/browser'
import { cylindersOnPhone } from '../helpers/copyOnPhone'
import { PASSWORD, type Member } from '../helpers/firm'
import { cylinderNow, made, openShop, registered, type Shop } from '../helpers/fleet'
import { openFrontDoor, type FrontDoor } from '../helpers/frontDoor'
import { handScanner } from '../helpers/handScanner'
import { startServer, type TestServer } from '../helpers/server'
import { PHONE, visit } from '../helpers/visit'

let server: TestServer
let shop: Shop
let browser: Browser
let van: Place

beforeAll(async () => {
  [server, browser] = await Promise.all([startServer(), launchBrowser()])
  shop = await openShop(server)
  van = await made<Place>(shop.admin.client, '/api/places', { name: 'Van 3', kind: 'van', technicianId: shop.technician.id })
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

type Line = CustodyLogAnswer['items'][number] & { cylinderId: string }

const pathOf = ({ labelCode }: CylinderView) => `/c/${labelCode!.toLowerCase()}`
const addressOf = ({ labelCode }: CylinderView) => `${server.baseUrl}/C/${labelCode!}`.toUpperCase()

/** What was recorded of cylinders after their registration, in the order of its arrival. */
async function recordedOf(cylinders: readonly CylinderView[]): Promise<Line[]> {
  const logs = await Promise.all(cylinders.map(async ({ id: cylinderId }) => {
    const { items } = (await shop.manager.client.get<CustodyLogAnswer>(`/api/cylinders/${cylinderId}/events?limit=200`)).body
    return items.map(line => ({ ...line, cylinderId }))
  }))
  return logs.flat().filter(({ kind }) => kind !== 'registered' && kind !== 'labelled').sort((a, b) => a.seq - b.seq)
}

/** What the scale showed at each weighing of a cylinder, and who wrote it down, in the order of arrival. */
async function weighings(cylinder: CylinderView): Promise<[pounds: number, author: string][]> {
  return (await recordedOf([cylinder])).map(({ details, author }) => [(details as { gross: Extract<MassReading, { unit: 'lb' }> }).gross.value, author.name])
}

async function several(count: number): Promise<CylinderView[]> {
  const made: CylinderView[] = []
  for (let at = 0; at < count; at++) made.push(await registered(shop))
  return made
}

/** A page at a form of a cylinder; of a person who has to sign in for it, where one is named. */
async function atForm(context: BrowserContext, cylinder: CylinderView, form: string, member?: Member): Promise<Page> {
  const page = await context.newPage()
  await page.goto(`${server.baseUrl}${pathOf(cylinder)}/act/${form}`, { waitUntil: 'networkidle' })
  if (member) await signIn(page, member)
  return page
}

async function weigh(page: Page, pounds: string): Promise<void> {
  await page.getByLabel('The scale shows, pounds').fill(pounds)
  await page.getByRole('button', { name: 'Record the weight' }).click()
}

/** Waits until a phone's copy of the fleet has these cylinders. */
async function hasCopyOf(page: Page, cylinders: readonly CylinderView[]): Promise<void> {
  for (const { id } of cylinders) await expect.poll(() => cylindersOnPhone(page, id), { timeout: 20_000 }).toBe(1)
}

const saved = (page: Page) => page.getByText('Saved on this phone', { exact: true }).waitFor()
const waits = (page: Page, count: number) => page.getByRole('link', { name: new RegExp(`^${count} waiting to send`) })
const allRecorded = (page: Page) => page.getByText('Everything from this device is recorded.').waitFor()

async function signIn(page: Page, { email }: Member): Promise<void> {
  await page.waitForURL(url => url.pathname === '/sign-in', { waitUntil: 'networkidle' })
  await page.getByLabel('Email address').fill(email)
  await page.getByLabel('Password', { exact: true }).fill(PASSWORD)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(url => url.pathname !== '/sign-in')
}

describe('an entry that meets trouble on its way', () => {
  /** How the next requests end: by an answer before anything is recorded, or cut after it was. */
  let fault: 401 | 409 | 500 | 'cut' | null = null

  async function troubled(member: Member | null): Promise<BrowserContext> {
    const context = await visit(browser, member?.client ?? null)
    await context.route('**/api/events', async (route) => {
      if (fault === null) return route.continue()
      if (fault !== 'cut') return route.fulfill({ status: fault, contentType: 'application/problem+json', json: { type: 'about:blank', title: 'Not now', status: fault, detail: 'Not now.' } })
      await route.fetch()
      await route.abort('connectionreset')
    })
    return context
  }

  it('is neither lost nor doubled by a 401, a 409, a 500 and a cut connection', async () => {
    const cylinder = await registered(shop)
    const context = await troubled(shop.technician)
    const faults = [401, 409, 500, 'cut'] as const
    for (const [at, next] of faults.entries()) {
      fault = next
      const page = await atForm(context, cylinder, 'weighed')
      await weigh(page, String(41 + at))
      await saved(page)
      await waits(page, at + 1).waitFor()
      await page.close()
    }
    fault = null
    const page = await context.newPage()
    await page.goto(`${server.baseUrl}/unsent`)
    await allRecorded(page)
    expect(await weighings(cylinder)).toEqual([41, 42, 43, 44].map(pounds => [pounds, 'Tina']))
    await context.close()
  })

  it('stays sealed while another person works on the phone, and goes under its author afterwards', async () => {
    const [tinas, wess] = [await registered(shop), await registered(shop)]
    // With a session of its own, which it ends.
    const context = await troubled(null)
    fault = 500
    const page = await atForm(context, tinas, 'weighed', shop.technician)
    await weigh(page, '41')
    await saved(page)
    await page.goto(`${server.baseUrl}/account`, { waitUntil: 'networkidle' })
    await page.getByRole('main').getByRole('button', { name: 'Sign out' }).click()
    const asked = page.getByRole('dialog', { name: 'Sign out with 1 entry not sent' })
    await asked.getByRole('button', { name: 'Sign out' }).click()
    fault = null
    await signIn(page, shop.warehouse)
    await page.goto(`${server.baseUrl}/unsent`)
    await page.getByText('1 entry of another person waits on this device').waitFor()
    const form = await atForm(context, wess, 'weighed')
    await weigh(form, '42')
    await form.getByText('Recorded: weighed').first().waitFor()
    expect(await weighings(tinas)).toEqual([])
    await form.close()

    await page.goto(`${server.baseUrl}/account`, { waitUntil: 'networkidle' })
    await page.getByRole('main').getByRole('button', { name: 'Sign out' }).click()
    await signIn(page, shop.technician)
    await page.goto(`${server.baseUrl}/unsent`)
    await allRecorded(page)
    expect([await weighings(tinas), await weighings(wess)]).toEqual([[[41, 'Tina']], [[42, 'Wes']]])
    await context.close()
  })
})

describe('entries that were saved side by side', () => {
  it('in two tabs have each a number of their own, and one tab sends all of them', async () => {
    const [one, other] = [await registered(shop), await registered(shop)]
    const context = await visit(browser, shop.technician.client)
    const sent: string[] = []
    context.on('request', (request) => {
      if (request.url().endsWith('/api/events') && request.method() === 'POST') sent.push(...(request.postDataJSON() as { events: { id: string, deviceSeq: number }[] }).events.map(({ id, deviceSeq }) => `${id} ${deviceSeq}`))
    })
    const tabs = [await atForm(context, one, 'weighed'), await atForm(context, other, 'weighed')] as const
    await context.setOffline(true)
    await Promise.all(tabs.map((tab, at) => weigh(tab, String(41 + at))))
    await Promise.all(tabs.map(async (tab) => {
      await saved(tab)
      await waits(tab, 2).waitFor()
    }))
    await context.setOffline(false)
    await waits(tabs[0], 2).click()
    await tabs[0].getByRole('button', { name: 'Send now' }).click()
    await allRecorded(tabs[0])
    await waits(tabs[1], 2).waitFor({ state: 'detached' })
    expect(sent).toHaveLength(2)
    expect(new Set(sent.map(each => each.split(' ')[1])).size).toBe(2)
    expect([await weighings(one), await weighings(other)]).toEqual([[[41, 'Tina']], [[42, 'Tina']]])
    await context.close()
  })

  it('on two phones about one cylinder are both kept, and what they come to is found', async () => {
    const WENT_IN = ['R-22', 'R-410A']
    const cylinder = await registered(shop, { contents: 'evacuated' })
    const phones = await Promise.all([shop.technician, shop.warehouse].map(({ client }) => visit(browser, client)))
    const pages = await Promise.all(phones.map((phone, at) => atForm(phone, cylinder, `filled?refrigerant=${WENT_IN[at]}`)))
    await Promise.all(pages.map(async (page, at) => {
      await phones[at]!.setOffline(true)
      await page.getByLabel('Scale before, pounds').fill('27.5')
      await page.getByLabel('Scale after, pounds').fill('30')
      await page.getByRole('button', { name: 'Record the recovery' }).click()
      await saved(page)
    }))
    for (const [at, page] of pages.entries()) {
      await phones[at]!.setOffline(false)
      await page.getByRole('link', { name: /^1 waiting to send/ }).click()
      await page.getByRole('button', { name: 'Send now' }).click()
      await allRecorded(page)
    }
    expect((await recordedOf([cylinder])).map(({ kind, details }) => [kind, (details as { refrigerant: string }).refrigerant])).toEqual(WENT_IN.map(refrigerant => ['filled', refrigerant]))
    expect((await cylinderNow(shop.manager.client, cylinder.id)).findings.map(({ code }) => code)).toContain('second-refrigerant')
    await Promise.all(phones.map(phone => phone.close()))
  })
})

describe('a phone that is away from the network', () => {
  const folder = mkdtempSync(join(tmpdir(), 'collarbook-phone-'))
  const SCANNED = 20
  const FILLED = 10
  let door: FrontDoor
  let cylinders: CylinderView[]

  beforeAll(async () => {
    door = await openFrontDoor(server.baseUrl)
    cylinders = await several(SCANNED)
  })
  afterAll(async () => {
    await door?.close()
    rmSync(folder, { recursive: true, force: true })
  })

  const switchOn = () => launchProfile(folder, { viewport: PHONE, timezoneId: 'America/Chicago' })

  async function open(phone: BrowserContext, path: string): Promise<Page> {
    const page = await phone.newPage()
    await page.goto(`${door.baseUrl}${path}`, { waitUntil: 'networkidle' })
    return page
  }

  it('starts without it, and keeps 30 scans and fills over a killed browser, an update and an ended session: each is recorded once and in order', async () => {
    const before = await switchOn()
    await before.addCookies([...shop.technician.client.cookies].map(([name, value]) => ({ name, value, url: door.baseUrl })))
    const visited = await open(before, '/scan')
    await visited.evaluate(() => navigator.serviceWorker.ready.then(() => undefined))
    await hasCopyOf(visited, cylinders)
    await visited.close()

    door.state = 'cut'
    await before.setOffline(true)
    const page = await open(before, `/batch?act=load&van=${van.id}`)
    await page.getByRole('heading', { name: 'Load Van 3' }).waitFor()
    const scanner = await handScanner(page)
    for (const view of cylinders) {
      await scanner.scan(addressOf(view), { enter: true })
      await page.getByRole('button', { name: `Take ${formatLabelCode(view.labelCode!)} off the list` }).waitFor()
    }
    await page.getByRole('button', { name: 'Put 20 on Van 3' }).click()
    await waits(page, SCANNED).waitFor()

    await page.goto(`${door.baseUrl}/account`, { waitUntil: 'networkidle' })
    await page.getByRole('heading', { name: 'Your account' }).waitFor()
    for (const view of cylinders.slice(0, FILLED)) {
      await scanner.scan(addressOf(view), { enter: true })
      const link = page.getByRole('link', { name: 'Record a recovery' })
      await link.waitFor()
      const hand = await watchHand(page)
      await link.click()
      await page.getByRole('button', { name: 'As last weighed: 40.0 lb' }).click()
      await page.keyboard.type('45')
      await page.getByRole('button', { name: 'Record the recovery' }).click()
      await saved(page)
      expect(await hand.done(), 'from the decoded code on').toEqual({ taps: 3, numbers: 1 })
    }
    await waits(page, SCANNED + FILLED).waitFor()
    await crash(before)

    const after = await switchOn()
    await after.setOffline(true)
    const again = await open(after, '/unsent')
    await again.getByRole('heading', { name: '30 waiting to send' }).waitFor()

    // There is a network, another build on the server, and no session any more; no entry gets through yet.
    door.changed.set('/api/events', null)
    door.changed.set('/sw.js', worker => `${worker}\n// another build`)
    door.state = 'open'
    await after.setOffline(false)
    await again.evaluate(takeNewVersion)
    await again.reload()
    await signIn(again, shop.technician)
    await again.getByRole('heading', { name: '30 waiting to send' }).waitFor()
    door.changed.delete('/api/events')
    await again.getByRole('button', { name: 'Send now' }).click()
    await allRecorded(again)
    const lines = await recordedOf(cylinders)
    expect(lines.map(({ kind }) => kind)).toEqual([...Array(SCANNED).fill('moved'), ...Array(FILLED).fill('filled')])
    expect(lines.map(({ cylinderId }) => cylinderId)).toEqual([...cylinders, ...cylinders.slice(0, FILLED)].map(({ id }) => id))
    await after.close()
  })

  /** Counts what a hand does on a page from now on: its taps, and the fields that it types into. */
  async function watchHand(page: Page) {
    const counted = await page.evaluateHandle(() => {
      const hand = { taps: 0, fields: new Set<EventTarget | null>() }
      addEventListener('click', event => hand.taps += event.isTrusted ? 1 : 0, true)
      addEventListener('input', event => event.isTrusted && hand.fields.add(event.target), true)
      return hand
    })
    return { done: () => counted.evaluate(({ taps, fields }) => ({ taps, numbers: fields.size })) }
  }

  /** Fetches the new worker and lets it take over, as the button does. */
  async function takeNewVersion(): Promise<void> {
    const registration = await navigator.serviceWorker.ready
    const taken = new Promise(done => navigator.serviceWorker.addEventListener('controllerchange', done, { once: true }))
    await registration.update()
    const coming = registration.installing ?? registration.waiting
    if (!coming) throw new Error('There is no new version')
    if (coming.state !== 'installed') {
      await new Promise<void>((done) => {
        coming.addEventListener('statechange', () => coming.state === 'installed' && done())
      })
    }
    coming.postMessage('take over')
    await taken
  }
})
