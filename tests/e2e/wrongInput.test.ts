import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CustodyLogAnswer } from '../../utils/contract/custody'
import type { MintAnswer } from '../../utils/contract/labels'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser } from '../helpers/browser'
import { addMember, PASSWORD, type Member } from '../helpers/firm'
import { cylinderNow, made, openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'
import { readied } from '../helpers/readyShipment'
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

interface AtForm { page: Page, context: BrowserContext, id: string }

/** The technician's phone at a form for a cylinder with 12.5 lb of R-22: tare 27.5 lb, fill limit 0.80 x 47.6 = 38.08 lb. */
async function atForm(kind: 'filled' | 'weighed', { client } = shop.technician): Promise<AtForm> {
  const { id, labelCode } = await registered(shop)
  const context = await visit(browser, client)
  const page = await context.newPage()
  await page.goto(`${server.baseUrl}/c/${labelCode!.toLowerCase()}/act/${kind}`, { waitUntil: 'networkidle' })
  return { page, context, id }
}

/** A recovery of 2 lb, ready to be recorded. */
async function atRecovery(by = shop.technician): Promise<AtForm> {
  const form = await atForm('filled', by)
  await form.page.getByLabel('Looked at it: sound').check()
  await weights(form.page, '40', '42')
  return form
}

async function weights(page: Page, before: string, after: string): Promise<void> {
  await page.getByLabel('Scale before, pounds').fill(before)
  await page.getByLabel('Scale after, pounds').fill(after)
}

/** The kinds in a cylinder's log, the newest first, with what each author looked at again. */
async function logOf(id: string): Promise<CustodyLogAnswer['items']> {
  return (await shop.auditor.client.get<CustodyLogAnswer>(`/api/cylinders/${id}/events`)).body.items
}

async function kindsOf(id: string): Promise<string[]> {
  return (await logOf(id)).map(line => line.kind)
}

const BEFORE = ['labelled', 'registered']
const record = (page: Page) => page.getByRole('button', { name: /^Record the/ }).click()

describe('a weight that cannot be read', () => {
  it.each([
    ['1,022', 'can be read in two ways'],
    ['4o', 'is not a weight'],
    ['-3', 'is not a weight'],
  ])('is asked for again and not recorded: %s %s', async (typed, words) => {
    const { page, context, id } = await atForm('weighed')
    await page.getByLabel('The scale shows, pounds').fill(typed)
    await record(page)
    await page.getByText(words).first().waitFor()
    expect(await page.getByLabel('The scale shows, pounds').inputValue()).toBe(typed)
    expect(await kindsOf(id)).toEqual(BEFORE)
    await context.close()
  })

  it('is pounds without their ounces: 0 is written where the scale shows none', async () => {
    const { page, context, id } = await atForm('weighed')
    await page.getByRole('group', { name: 'Unit of the scale' }).getByRole('button', { name: 'lb oz' }).click()
    await page.getByLabel('The scale shows, pounds').fill('41')
    await record(page)
    await page.getByText('The ounces are missing. Write 0 if the scale shows none.').first().waitFor()
    expect(await kindsOf(id)).toEqual(BEFORE)
    await page.getByLabel('The scale shows, ounces').fill('0')
    await record(page)
    await page.getByText('Recorded: weighed').first().waitFor()
    // 41 lb - 27.5 lb = 13.5 lb = 6123.5 g.
    expect((await cylinderNow(shop.auditor.client, id)).contents.netGrams).toBeGreaterThanOrEqual(6123)
    expect((await cylinderNow(shop.auditor.client, id)).contents.netGrams).toBeLessThanOrEqual(6124)
    await context.close()
    // The unit goes with the person: the forms after this one begin with pounds again.
    await shop.technician.client.patch('/api/session/units', { units: 'lb' })
  })
})

describe('a weight that is unlikely or dangerous', () => {
  it('below the tare asks once, and is then recorded with the word of its author', async () => {
    const { page, context, id } = await atForm('weighed')
    await page.getByLabel('The scale shows, pounds').fill('25')
    await page.getByText(/less than the tare/).first().waitFor()
    await record(page)
    await page.getByText('Tick that it happened, then record it.').waitFor()
    expect(await kindsOf(id)).toEqual(BEFORE)
    await page.getByLabel('Record it anyway: it happened').check()
    await record(page)
    await page.getByText('Recorded: weighed').first().waitFor()
    const [line] = await logOf(id)
    expect(line).toMatchObject({ kind: 'weighed', confirmed: expect.arrayContaining(['weigh-again']) })
    expect(line?.findings.map(finding => finding.code)).toContain('weigh-again')
    expect((await cylinderNow(shop.auditor.client, id)).contents.netGrams).toBeNull()
    await context.close()
  })

  it('above the fill limit shows the stop before it is sent, and afterwards what to do next', async () => {
    const { page, context, id } = await atForm('filled')
    await page.getByLabel('Looked at it: sound').check()
    // 70 - 27.5 = 42.5 lb, 4.42 lb more than 38.08 lb.
    await weights(page, '40', '70')
    await page.getByRole('heading', { name: 'Stop and look' }).waitFor()
    const shown = page.getByRole('alert', { name: 'What will be found' })
    await shown.getByText(/Overfilled by 4\.[45]/).waitFor()
    expect(await kindsOf(id)).toEqual(BEFORE)
    await page.getByLabel('Record it anyway: it happened').check()
    await record(page)
    await page.getByRole('heading', { name: 'What to do now' }).waitFor()
    await page.getByRole('region', { name: 'What was found' }).getByText(/draws it down/).waitFor()
    expect(await page.getByText('Next time, stop when the scale reads').count()).toBe(0)
    expect((await logOf(id))[0]).toMatchObject({ kind: 'filled', confirmed: expect.arrayContaining(['overfill']) })
    await context.close()
  })
})

describe('a recovery whose recording is disturbed', () => {
  const allRecorded = (page: Page) => page.getByText('Everything from this device is recorded.').waitFor()

  it('by a cut network is saved on the phone, says so, and is recorded once there is signal', async () => {
    const { page, context, id } = await atRecovery()
    await page.waitForLoadState('networkidle')
    await context.setOffline(true)
    await record(page)
    await page.getByText('Saved on this phone', { exact: true }).waitFor()
    expect(await kindsOf(id)).toEqual(BEFORE)
    await context.setOffline(false)
    await page.getByRole('link', { name: /^1 waiting to send/ }).click()
    await page.getByRole('button', { name: 'Send now' }).click()
    await allRecorded(page)
    expect(await kindsOf(id)).toEqual(['filled', ...BEFORE])
    await context.close()
  })

  it('by a lost answer is recorded once, though it is sent twice', async () => {
    const { page, context, id } = await atRecovery()
    let sendings = 0
    await page.route('**/api/events', async (route) => {
      sendings++
      const answer = await route.fetch()
      if (sendings === 1) return route.abort('connectionreset')
      await route.fulfill({ response: answer })
    })
    await record(page)
    await page.getByText('Saved on this phone', { exact: true }).waitFor()
    expect(await kindsOf(id)).toEqual(['filled', ...BEFORE])
    await page.getByRole('link', { name: /^1 waiting to send/ }).click()
    await allRecorded(page)
    expect(sendings).toBe(2)
    expect(await kindsOf(id)).toEqual(['filled', ...BEFORE])
    expect((await cylinderNow(shop.auditor.client, id)).version).toBe(3)
    await context.close()
  })

  it('by a session that ended is saved on the phone, asks to sign in, and goes then', async () => {
    const { page, context, id } = await atRecovery()
    await context.clearCookies({ name: 'collarbook' })
    await record(page)
    await page.getByText('Saved on this phone', { exact: true }).waitFor()
    expect(await kindsOf(id)).toEqual(BEFORE)
    await page.getByRole('link', { name: /sign in again$/ }).click()
    await page.getByRole('button', { name: 'Sign in again' }).click()
    await page.waitForURL(url => url.pathname === '/sign-in', { waitUntil: 'networkidle' })
    await page.getByLabel('Email address').fill(shop.technician.email)
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD)
    await page.getByRole('button', { name: 'Sign in' }).click()
    await allRecorded(page)
    expect(await kindsOf(id)).toEqual(['filled', ...BEFORE])
    await context.close()
  })
})

describe('a desk whose session ended', () => {
  async function deskAt(member: Member, path: string): Promise<{ page: Page, context: BrowserContext }> {
    const context = await visit(browser, member.client, { viewport: DESK })
    const page = await context.newPage()
    await page.goto(`${server.baseUrl}${path}`, { waitUntil: 'networkidle' })
    return { page, context }
  }

  async function signInAgain(page: Page, member: Member, thenShown: string): Promise<void> {
    await page.waitForURL(url => url.pathname === '/sign-in', { waitUntil: 'networkidle' })
    await page.getByLabel('Email address').fill(member.email)
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD)
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.getByText(thenShown).waitFor()
  }

  it('still has the stamp that was copied, and lets go of it when told to', async () => {
    const { page, context } = await deskAt(shop.warehouse, '/fleet/register')
    const serial = page.getByLabel('Serial', { exact: true })
    await serial.fill('KX5521')
    await page.getByLabel('Tare weight, TW, pounds').fill('27.5')
    await context.clearCookies({ name: 'collarbook' })
    await page.goto(`${server.baseUrl}/fleet/register`)
    await signInAgain(page, shop.warehouse, 'Kept from before:')
    await expect.poll(() => serial.inputValue()).toBe('KX5521')
    expect(await page.getByLabel('Tare weight, TW, pounds').inputValue()).toBe('27.5')
    await page.getByRole('button', { name: 'Start over' }).click()
    await expect.poll(() => serial.inputValue()).toBe('')
    await page.reload({ waitUntil: 'networkidle' })
    expect(await page.getByText('Kept from before:').count()).toBe(0)
    await context.close()
  })

  it('still has a shipment that is ready, and sends it off once', async () => {
    const { id } = await registered(shop)
    const shipment = await made<{ id: string }>(shop.manager.client, '/api/shipments', { toFirmId: shop.reclaimer.id, cylinderIds: [id] })
    await readied(shop.manager.client, shipment.id, [{ cylinderId: id, gross: lb(40) }])
    const { page, context } = await deskAt(shop.manager, `/shipments/${shipment.id}`)
    await context.clearCookies({ name: 'collarbook' })
    const send = async () => {
      await page.getByRole('button', { name: 'Dispatch 1 cylinder' }).click()
      await page.getByRole('dialog').getByRole('button', { name: 'Ship 1 cylinder' }).click()
    }
    await send()
    await signInAgain(page, shop.manager, 'It is ready to leave.')
    expect(await kindsOf(id)).toEqual(BEFORE)
    await send()
    await page.getByText('Print this list').waitFor()
    expect(await kindsOf(id)).toEqual(['sent-for-reclaim', ...BEFORE])
    await context.close()
  })
})

describe('a phone that changes hands', () => {
  it('keeps nothing of whoever signs out: neither on the way back nor in the forms', async () => {
    const { page, context, id } = await atRecovery(await addMember(shop.admin, 'Theo', ['technician']))
    const form = page.url()
    await page.goto(`${server.baseUrl}/account`, { waitUntil: 'networkidle' })
    await page.getByRole('button', { name: 'Sign out' }).click()
    await page.waitForURL(url => url.pathname === '/sign-in', { waitUntil: 'networkidle' })
    await page.goBack({ waitUntil: 'networkidle' })
    await page.getByLabel('Email address').waitFor()
    expect(new URL(page.url()).pathname).toBe('/sign-in')

    await context.addCookies([...shop.warehouse.client.cookies].map(([name, value]) => ({ name, value, url: server.baseUrl })))
    await page.goto(form, { waitUntil: 'networkidle' })
    expect(await page.getByLabel('Scale after, pounds').inputValue()).toBe('')
    expect(await page.getByText('Kept from before:').count()).toBe(0)
    expect(await kindsOf(id)).toEqual(BEFORE)
    await context.close()
  })
})

describe('a label that does not lead to a cylinder', () => {
  it('says so on its page, and offers the scan', async () => {
    const { codes: [code] } = await made<MintAnswer>(shop.warehouse.client, '/api/labels', { count: 1 })
    const context = await visit(browser, shop.technician.client)
    const page = await context.newPage()
    const answer = await page.goto(`${server.baseUrl}/c/${code}`, { waitUntil: 'networkidle' })
    expect(answer?.status()).toBe(404)
    await page.getByText('No cylinder has this label.').waitFor()
    await page.getByRole('link', { name: 'Scan again' }).waitFor()
    await context.close()
  })

  it('typed with two neighbours swapped names the groups to compare, and offers the cylinder that is meant', async () => {
    const { labelCode } = await registered(shop)
    const at = [...labelCode!].findIndex((character, index) => index < 8 && character !== labelCode![index + 1])
    const typed = labelCode!.slice(0, at) + labelCode![at + 1] + labelCode![at] + labelCode!.slice(at + 2)
    const group = typed.slice(Math.floor(at / 3) * 3, Math.floor(at / 3) * 3 + 3)
    const context = await visit(browser, shop.technician.client)
    const page = await context.newPage()
    await page.goto(`${server.baseUrl}/scan`, { waitUntil: 'networkidle' })
    const type = page.getByRole('button', { name: 'Type' })
    // Without a camera the field is there already.
    await type.or(page.getByText('This device has no camera')).first().waitFor()
    if (await type.isVisible()) await type.click()
    await page.getByLabel('Nine characters of the label').fill(typed)
    await page.getByText(new RegExp(`The ninth character does not fit\\. Compare .*${group}.* with the label\\.`)).waitFor()
    await page.getByRole('button', { name: formatLabelCode(labelCode!) }).click()
    await page.getByRole('region', { name: `Cylinder ${formatLabelCode(labelCode!)}` }).waitFor()
    await context.close()
  })
})

describe('signing in', () => {
  it('with a wrong password says so without a word on which of the two is wrong', async () => {
    const context = await visit(browser, null)
    const page = await context.newPage()
    await page.goto(`${server.baseUrl}/sign-in`, { waitUntil: 'networkidle' })
    const said: string[] = []
    for (const email of [shop.technician.email, 'nobody@harbor.example']) {
      await page.getByLabel('Email address').fill(email)
      await page.getByLabel('Password', { exact: true }).fill('not-this-one-0000')
      const [answer] = await Promise.all([
        page.waitForResponse(response => response.url().endsWith('/api/session') && response.request().method() === 'POST'),
        page.getByRole('button', { name: 'Sign in' }).click(),
      ])
      expect(answer.status()).toBe(401)
      said.push((await page.getByRole('alert').innerText()).replaceAll(/\s+/g, ' '))
      expect(await page.getByLabel('Email address').inputValue()).toBe(email)
    }
    expect(said[0]).toMatch(/password/i)
    expect(said[1]).toBe(said[0])
    await context.close()
  })
})
