import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { crash, launchProfile, listenForErrors } from '../helpers/browser'
import { cylindersOnPhone } from '../helpers/copyOnPhone'
import { openShop, registered, type Shop } from '../helpers/fleet'
import { openFrontDoor, type FrontDoor } from '../helpers/frontDoor'
import { startServer, type TestServer } from '../helpers/server'
import { PHONE } from '../helpers/visit'

// One phone through all of it, in order: its first visit, the basement, a server that hangs, an update, an ended session, and
// signing out. The worker is the real one.

/** How long a page may take that waits for a silent server first (3 s), on a machine that tests. Units: milliseconds. */
const WITH_PATIENCE_MS = 20_000

let server: TestServer
let door: FrontDoor
let shop: Shop
let code: string
let folder: string
let phone: BrowserContext
let errors: string[]

beforeAll(async () => {
  server = await startServer()
  door = await openFrontDoor(server.baseUrl)
  shop = await openShop(server)
  code = (await registered(shop)).labelCode!.toLowerCase()
  folder = mkdtempSync(join(tmpdir(), 'collarbook-phone-'))
  phone = await turnedOn()
  await signedIn()
})
afterAll(async () => {
  await phone?.close()
  await door?.close()
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

async function turnedOn(): Promise<BrowserContext> {
  const context = await launchProfile(folder, { viewport: PHONE, timezoneId: 'America/Chicago' })
  context.setDefaultTimeout(WITH_PATIENCE_MS)
  errors = listenForErrors(context)
  return context
}

async function signedIn() {
  await phone.addCookies([...shop.technician.client.cookies].map(([name, value]) => ({ name, value, url: door.baseUrl })))
}

/** A page opened from nothing. */
async function open(path: string): Promise<Page> {
  const page = await phone.newPage()
  await page.goto(`${door.baseUrl}${path}`)
  return page
}

/** The visit that puts the application and the copy of the fleet onto the phone. */
async function firstVisit() {
  const page = await open('/scan')
  await page.evaluate(() => navigator.serviceWorker.ready.then(() => undefined))
  await expect.poll(() => cylindersOnPhone(page), { timeout: WITH_PATIENCE_MS }).toBe(1)
  await page.close()
}

/** Every address that any cache of the worker holds, and the shell's text. */
function cached(): Promise<{ paths: string[], shell: string }> {
  return caches.keys().then(async (names) => {
    const requests = (await Promise.all(names.map(async name => (await caches.open(name)).keys()))).flat()
    const shell = requests.find(({ url }) => new URL(url).pathname === '/shell')
    return { paths: requests.map(({ url }) => new URL(url).pathname), shell: await (await caches.match(shell!))!.text() }
  })
}

/** The field's screens, each from nothing, as a phone shows them that reaches no server. */
async function showsTheField() {
  const [scan, cylinder, start] = await Promise.all(['/scan', `/c/${code}`, '/'].map(open)) as [Page, Page, Page]
  await scan.getByRole('heading', { name: 'Scan', level: 1 }).waitFor()
  await cylinder.getByText('Stop when the scale reads').waitFor()
  await start.waitForURL('**/scan')
  await start.getByRole('heading', { name: 'Scan', level: 1 }).waitFor()
  await Promise.all([scan, cylinder, start].map(page => page.close()))
}

describe('a phone that was here once', () => {
  it('keeps the application and nothing that was drawn for its person', async () => {
    await firstVisit()
    const page = await open('/sign-in')
    const { paths, shell } = await page.evaluate(cached)
    expect(paths.length).toBeGreaterThan(100)
    expect(paths.filter(path => !/^\/(_nuxt\/[\w.-]+|icons\/[\w-]+\.png|logo(-mono)?\.svg|manifest\.webmanifest|shell)$/.test(path))).toEqual([])
    expect(shell).toContain('<script')
    expect(shell).not.toContain('Tina')
    expect(await page.evaluate(() => localStorage.getItem('collarbook-person'))).toContain('"name":"Tina"')
    await page.close()
  })

  it('opens the scanner, a label\'s cylinder and the first screen with neither server nor network, also after it was killed', async () => {
    await crash(phone)
    await server.kill()
    phone = await turnedOn()
    // A browser writes its cookies down half a minute late, which is longer than this visit was.
    await signedIn()
    await phone.setOffline(true)
    await showsTheField()
    // A screen of the desk says what it needs, and the way on.
    const fleet = await open('/places')
    await fleet.getByText('Lists, papers and settings need the server').waitFor()
    expect(await fleet.getByRole('link', { name: 'Scan a label' }).getAttribute('href')).toBe('/scan')
    await fleet.close()
    // What is never there without the server fails as such; no policy of the page stood in the way of anything.
    expect(errors.filter(text => !/net::ERR_/.test(text))).toEqual([])
  })

  it('waits three seconds for a server that takes the question and says nothing', async () => {
    await phone.setOffline(false)
    door.state = 'silent'
    const asked = Date.now()
    const page = await open('/scan')
    await page.getByRole('heading', { name: 'Scan', level: 1 }).waitFor({ timeout: WITH_PATIENCE_MS })
    expect(Date.now() - asked).toBeGreaterThan(2_900)
    await page.close()
    door.state = 'cut'
    await showsTheField()
    await server.restart()
    door.state = 'open'
  })
})

describe('a newer version on the server', () => {
  it('waits until it is taken, and what was opened with the one before goes on', async () => {
    const old = await open('/account')
    await expect.poll(() => old.evaluate(() => navigator.serviceWorker.controller !== null)).toBe(true)
    const outgoing = await anotherBuild(old)

    const page = await open('/account')
    await page.evaluate(() => navigator.serviceWorker.ready.then(ready => ready.update()).then(() => undefined))
    const take = page.getByRole('button', { name: 'Take the new version' })
    await take.waitFor({ timeout: WITH_PATIENCE_MS })
    // It waits: what is opened without the server is the version before.
    await phone.setOffline(true)
    expect(await isSecond(await open('/scan'))).toBe(false)
    await phone.setOffline(false)
    // In a window that goes on working it is offered with the next page, and not before.
    expect(await page.getByText('A new version is ready').count()).toBe(0)
    await page.getByRole('link', { name: 'Start' }).click()
    await page.getByText('A new version is ready').waitFor()
    const reloaded = page.waitForEvent('load')
    await page.getByRole('button', { name: 'Take it now' }).click()
    await reloaded

    await phone.setOffline(true)
    await expect.poll(async () => isSecond(await open('/scan'))).toBe(true)
    // The other window was left alone, and still gets the file that only its version has.
    expect(await old.evaluate(path => fetch(path).then(({ status }) => status), outgoing)).toBe(200)
    await showsTheField()
    await phone.setOffline(false)
  })

  /** The front door seems to have another build behind it: another shell, and one script fewer, whose path it answers. */
  async function anotherBuild(page: Page): Promise<string> {
    const { paths } = await page.evaluate(cached)
    const script = paths.find(path => /^\/_nuxt\/[\w-]+\.js$/.test(path))!
    door.changed.set('/sw.js', worker => worker.replace(/(?<=addToCacheList\()\[.*?\](?=\))/, (list) => {
      const files = JSON.parse(list) as { url: string, revision: string | null }[]
      const kept = files.filter(({ url }) => url !== script.slice(1)).map(file => file.url === '/shell' ? { ...file, revision: 'second' } : file)
      expect(kept).toHaveLength(files.length - 1)
      return JSON.stringify(kept)
    }))
    door.changed.set('/shell', text => text.replace('<head>', '<head><meta name="test-build" content="second">'))
    door.changed.set(script, null)
    return script
  }

  async function isSecond(page: Page): Promise<boolean> {
    await page.getByRole('heading', { name: 'Scan', level: 1 }).waitFor({ timeout: WITH_PATIENCE_MS })
    const found = await page.locator('meta[name="test-build"]').count()
    await page.close()
    return found > 0
  }
})

describe('a session', () => {
  it('that ended while there is no network closes nothing here; with network it asks to sign in', async () => {
    await phone.clearCookies()
    await phone.setOffline(true)
    await showsTheField()
    await phone.setOffline(false)
    const page = await open('/scan')
    await page.waitForURL('**/sign-in?next=/scan')
    await page.close()
  })

  it('that a person ends is forgotten here with all that they could read', async () => {
    await signedIn()
    await firstVisit()
    const page = await open('/account')
    await page.getByRole('button', { name: 'Sign out' }).click()
    await page.waitForURL('**/sign-in')
    expect(await page.evaluate(() => localStorage.getItem('collarbook-person'))).toBeNull()
    expect(await cylindersOnPhone(page)).toBe(0)
    await phone.setOffline(true)
    const later = await open('/scan')
    await later.getByRole('heading', { name: 'Sign in' }).waitFor()
  })
})
