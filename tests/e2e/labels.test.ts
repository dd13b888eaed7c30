import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { MintAnswer } from '../../utils/contract/labels'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import type { Member } from '../helpers/firm'
import { cylinderNow, made, openShop, registered, type Shop } from '../helpers/fleet'
import { handScanner } from '../helpers/handScanner'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let shop: Shop
let browser: Browser
const errors: string[][] = []

beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  browser = await launchBrowser()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function signedIn(member: Member): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, timezoneId: 'America/Chicago', serviceWorkers: 'block' })
  errors.push(listenForErrors(context))
  const page = await context.newPage()
  await page.goto(`${server.baseUrl}/sign-in`, { waitUntil: 'networkidle' })
  await page.getByLabel('Email address').fill(member.email)
  await page.getByLabel('Password', { exact: true }).fill(member.password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(url => url.pathname !== '/sign-in')
  return page
}

async function blankCode(): Promise<string> {
  return (await made<MintAnswer>(shop.warehouse.client, '/api/labels', { count: 1 })).codes[0]!
}

describe('labels from the printer to the cylinder', () => {
  it('printed ahead, the printing is open until one of them comes back from the hand scanner', async () => {
    const page = await signedIn(shop.warehouse)
    await page.goto(`${server.baseUrl}/labels?blank=3`, { waitUntil: 'networkidle' })
    await page.getByRole('button', { name: 'Make them' }).click()
    const codes = page.getByRole('list', { name: 'Codes to be printed' }).getByRole('listitem')
    await expect.poll(() => codes.count()).toBe(3)
    const [first] = await codes.allInnerTexts()
    await Promise.all([page.waitForEvent('popup'), page.getByRole('link', { name: 'Open 6 labels as a PDF' }).click()])
    await page.getByRole('heading', { name: 'Scan one back' }).waitFor()

    const other = await blankCode()
    const scanner = await handScanner(page)
    await scanner.scan(`${server.baseUrl.toUpperCase()}/C/${other}`, { enter: true })
    await page.getByText(`${formatLabelCode(other)} is none of those just printed.`).waitFor()

    await scanner.scan(`${server.baseUrl.toUpperCase()}/C/${first!.replaceAll(' ', '')}`, { enter: true })
    await page.getByText('It came back: the print is good').waitFor()
    await page.context().close()
  })

  it('one that was replaced opens its cylinder, and asks to be taken off', async () => {
    const before = await registered(shop)
    const page = await signedIn(shop.warehouse)
    await page.goto(`${server.baseUrl}/labels?cylinders=${before.id}`, { waitUntil: 'networkidle' })
    await page.getByLabel(/^Why/).fill('torn')
    await page.getByRole('button', { name: 'Replace its label' }).click()
    await page.getByRole('link', { name: 'Open 2 labels as a PDF' }).waitFor()
    const { labelCode } = await cylinderNow(shop.warehouse.client, before.id)
    expect(labelCode).not.toBe(before.labelCode)
    await page.goto(`${server.baseUrl}/c/${before.labelCode!.toLowerCase()}`, { waitUntil: 'networkidle' })
    await page.getByText(`The label ${formatLabelCode(before.labelCode!)} was replaced. Please take it off; the right one is ${formatLabelCode(labelCode!)}, on it since today`).waitFor()
    await page.context().close()
  })

  it('says nothing of errors on the way', () => {
    expect(errors.length).toBeGreaterThan(0)
    expect(errors.flat()).toEqual([])
  })
})
