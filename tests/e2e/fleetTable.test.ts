import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser } from '../helpers/browser'
import { openShop, registered, type Shop } from '../helpers/fleet'
import { fillFleet } from '../helpers/fleetRows'
import { startServer, type TestServer } from '../helpers/server'
import { DESK, PHONE, visit } from '../helpers/visit'

const MANY = 3_000
/** A hundred rows have three things each that take the focus, and the frame and the filters stand around them. */
const MOST_TABS = 450
/** Past it a person loses the thread. */
const PATIENCE_MS = 1_000

let server: TestServer
let shop: Shop
let browser: Browser
let context: BrowserContext
let page: Page

beforeAll(async () => {
  [server, browser] = await Promise.all([startServer(), launchBrowser()])
  shop = await openShop(server)
  await registered(shop)
  await fillFleet(server.databaseFile, MANY - 1, { places: [shop.shop.id], holders: [shop.technician.id], owner: shop.reclaimer.id })
  context = await visit(browser, shop.manager.client, { viewport: DESK })
  page = await context.newPage()
  page.setDefaultNavigationTimeout(60_000)
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

const open = (address = '') => page.goto(`${server.baseUrl}/fleet${address}`, { waitUntil: 'networkidle' })
const settled = () => page.waitForLoadState('networkidle')

/** Presses Tab until the focus is on what has this name. */
async function tabTo(name: string | RegExp): Promise<void> {
  for (let tab = 0; tab < MOST_TABS; tab++) {
    await page.keyboard.press('Tab')
    const at = await page.evaluate(() => {
      const focused = document.activeElement as HTMLInputElement | null
      return (focused?.getAttribute('aria-label') ?? focused?.labels?.[0]?.textContent ?? focused?.textContent ?? '').trim()
    })
    if (typeof name === 'string' ? at === name : name.test(at)) return
  }
  throw new Error(`The keyboard never came to ${name}`)
}

async function asks(part: RegExp): Promise<void> {
  await page.waitForURL(part, { timeout: 10_000 })
  await settled()
}

describe('the fleet without a mouse', () => {
  it.each([
    ['Refrigerant', 'refrigerant'], ['Place', 'place'], ['Stage of life', 'lifecycle'],
  ])('is filtered by %s', async (name, key) => {
    await open()
    await tabTo(name)
    await page.keyboard.press('ArrowDown')
    await asks(new RegExp(`[?&]${key}=`))
    await page.getByText('Shown:', { exact: true }).waitFor()
  })

  it.each([
    ['Finding', 'finding'], ['Condition', 'condition'], ['Holder', 'holder'], ['Owner', 'owner'], ['Retest due', 'dueBefore'],
  ])('is filtered by %s, behind more filters', async (name, key) => {
    await open()
    await tabTo('More filters')
    await page.keyboard.press('Enter')
    await tabTo(name)
    await page.keyboard.press('ArrowDown')
    await asks(new RegExp(`[?&]${key}=`))
  })

  it('is filtered by a label code, by a word and by a chip', async () => {
    await open()
    await tabTo('More filters')
    await page.keyboard.press('Space')
    await tabTo('Label code')
    // As fast as a hand scanner it would be taken for one, and open the cylinder.
    await page.keyboard.type('7k3m9q2tx', { delay: 120 })
    await page.keyboard.press('Enter')
    await asks(/label=7k3m9q2tx/)
    await open()
    await page.keyboard.press('/')
    await page.keyboard.type('K00012')
    await page.keyboard.press('Enter')
    await asks(/q=K00012/)
    await expect.poll(() => page.locator('tbody tr').count()).toBe(10)
    await open()
    await tabTo(/^Stop \d+$/)
    await page.keyboard.press('Enter')
    await asks(/finding=stop/)
  })

  it('is sorted, and sorted the other way', async () => {
    await open()
    for (const order of ['ascending', 'descending']) {
      await tabTo('Room, lb')
      await page.keyboard.press('Enter')
      await page.locator(`th[aria-sort=${order}]`, { hasText: 'Room' }).waitFor()
    }
    expect(page.url()).toMatch(/sort=room&order=desc/)
    expect(await page.locator('th[aria-sort]').count()).toBe(1)
  })

  it('is chosen from with the space bar over several pages, and turned', async () => {
    await open('?sort=serial')
    await tabTo(/^Choose (?!all)/)
    await page.keyboard.press('Space')
    await page.getByText('1 chosen').waitFor()
    await tabTo('Next page')
    await page.keyboard.press('Enter')
    await asks(/cursor=/)
    await page.getByRole('button', { name: 'Previous page' }).waitFor()
    await page.getByLabel(/^Choose (?!all)/).last().focus()
    await page.keyboard.press('Space')
    await page.getByText('2 chosen').waitFor()
  })

  it('opens a cylinder with Enter from its box', async () => {
    await open('?q=S1&sort=serial')
    await tabTo(/^Choose (?!all)/)
    await page.keyboard.press('Enter')
    await page.waitForURL(/\/c\//)
  })

  it('has its columns chosen, and keeps them on the server', async () => {
    await open()
    await tabTo('Columns')
    await page.keyboard.press('Enter')
    await page.getByRole('dialog').waitFor()
    await tabTo('Serial')
    await page.keyboard.press('Space')
    await tabTo('Keep this')
    await page.keyboard.press('Enter')
    await page.getByRole('columnheader', { name: 'Serial' }).waitFor()
    await open()
    expect(await page.getByRole('columnheader', { name: 'Serial' }).count()).toBe(1)
  })

  it('has a view saved under a name, and found again', async () => {
    await open('?refrigerant=R-22&sort=net')
    await tabTo('Save this view')
    await page.keyboard.press('Enter')
    await page.getByLabel('Name of the view').waitFor()
    await page.keyboard.type('R-22 by net')
    await page.keyboard.press('Enter')
    await page.getByRole('link', { name: 'R-22 by net' }).waitFor()
    await open()
    await tabTo('R-22 by net')
    await page.keyboard.press('Enter')
    await asks(/refrigerant=R-22/)
    expect(page.url()).toContain('sort=net')
  })
})

describe(`a fleet of ${MANY}`, () => {
  it('shows a hundred with the whole number, and answers a filter before a person loses the thread', async () => {
    await open()
    expect(await page.locator('tbody tr').count()).toBe(100)
    await page.getByText('3000 cylinders, most urgent first').waitFor()
    const times: number[] = []
    await page.keyboard.press('/')
    for (const word of ['K0001', 'K0002', 'K0003', 'K0004', 'K0005']) {
      await page.keyboard.press('Control+A')
      await page.keyboard.type(word)
      const since = Date.now()
      await page.keyboard.press('Enter')
      await page.getByRole('button', { name: `Clear found by “${word}”` }).waitFor()
      await page.waitForFunction(start => [...document.querySelectorAll('tbody tr')].length === 100 && location.search.includes(start), word)
      times.push(Date.now() - since)
    }
    expect(times.toSorted((a, b) => a - b)[2]!).toBeLessThan(PATIENCE_MS)
  })

  it('stands in cards on a phone, without a way sideways', async () => {
    const phone = await (await visit(browser, shop.manager.client, { viewport: PHONE })).newPage()
    await phone.goto(`${server.baseUrl}/fleet`, { waitUntil: 'networkidle' })
    expect(await phone.getByRole('list', { name: 'Cylinders of the fleet' }).locator(':scope > li').count()).toBe(100)
    expect(await phone.evaluate(() => document.documentElement.scrollWidth)).toBe(PHONE.width)
    await phone.close()
  })
})
