import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CustodyLogAnswer } from '../../utils/contract/custody'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import type { Member } from '../helpers/firm'
import { firstVisit } from '../helpers/firstVisit'
import { cylinderNow, openShop, registered, type Shop } from '../helpers/fleet'
import { openFrontDoor } from '../helpers/frontDoor'
import { startServer, type TestServer } from '../helpers/server'
import { PHONE, visit } from '../helpers/visit'

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

const NAMES: Record<string, string> = { '.': 'Decimal point' }

/** Presses the keys of the pad, one for each character. */
async function press(page: Page, figure: string): Promise<void> {
  const pad = page.getByRole('region', { name: /^(Scale reads|Gross)/ })
  for (const key of figure) await pad.getByRole('button', { name: NAMES[key] ?? key, exact: true }).click()
}

describe('a recovery beside the scale', () => {
  it('goes from the cylinder to its tag in pounds, opens where it was when the page was closed, and calls the stop until it is answered', async () => {
    // TW 27.5 lb, WC 47.6 lb: 0.80 x 47.6 = 38.08 lb, stop at 65.58 lb, shown as 65.5; 90 % of it from 61.77 lb on.
    const cylinder = await registered(shop)
    const context = await visit(browser, shop.technician.client)
    const said = listenForErrors(context)
    const before = await context.newPage()
    await before.goto(`${server.baseUrl}/c/${cylinder.labelCode!.toLowerCase()}`, { waitUntil: 'networkidle' })
    await before.getByRole('link', { name: /^Recover into it/ }).click()
    await before.getByRole('button', { name: 'Start filling' }).click()
    await before.getByRole('alert').filter({ hasText: 'Weigh it before the hoses go on' }).waitFor()
    await before.getByRole('button', { name: 'As last weighed: 40.0 lb' }).click()
    await before.getByLabel('Looked at it: sound').check()
    await before.getByLabel('Hoses and lines purged').check()
    await before.getByRole('button', { name: 'machine, push-pull' }).click()
    await before.getByText('Close the valve at the stop weight').waitFor()
    await before.getByRole('button', { name: 'Start filling' }).click()

    await before.getByText('Stop when the scale reads').waitFor()
    expect(await before.locator('main').innerText()).toMatch(/65\.5\s*lb/)
    expect(await before.getByRole('textbox').count(), 'no field that opens the keyboard of the system').toBe(0)
    await press(before, '50.5')
    await before.getByRole('button', { name: 'Note 50.5 lb' }).click()
    await before.getByRole('status').filter({ hasText: '15.0 lb to go' }).waitFor()
    await before.keyboard.type('62.3')
    await before.keyboard.press('Enter')
    await before.getByText(/^Past 90 % of 38\.0\s*lb/).waitFor()
    await before.close()

    const page = await context.newPage()
    await page.goto(`${server.baseUrl}/now`, { waitUntil: 'networkidle' })
    await page.getByRole('link', { name: /^Go on with it: .*a recovery beside the scale/ }).click()
    await page.getByText('2 readings, kept').waitFor()
    await page.getByRole('button', { name: 'Take back 62.3 lb' }).click()
    await page.getByRole('button', { name: 'Take back 50.5 lb' }).waitFor()
    await press(page, '49')
    await page.getByRole('button', { name: 'Note 49.0 lb' }).click()
    await page.getByRole('alert').filter({ hasText: '49.0 lb is less than 50.5 lb before' }).waitFor()
    await page.getByRole('button', { name: 'No, type it again' }).click()
    await press(page, '65.5')
    await page.getByRole('button', { name: 'Note 65.5 lb' }).click()
    await page.getByRole('alert').filter({ hasText: 'Stop. Shut the valve now.' }).waitFor()
    await page.getByRole('button', { name: 'It is stopped: hoses off' }).click()

    await page.getByText('This one does not count.').waitFor()
    for (const name of ['Recovery machine off', 'Cylinder valves shut', 'Hoses off, caps on']) await page.getByLabel(name).check()
    await page.getByRole('button', { name: 'Hoses are off: weigh it' }).click()
    await press(page, '65.4')
    await page.getByRole('button', { name: 'Take 65.4 lb' }).click()
    await page.getByText('+25.4 lb').waitFor()
    // 40 CFR 82.156 Table 1: R-22 in a system of unknown charge, by a machine of unknown date, 10 inHg at most.
    await page.getByText('Vacuum of the system, and how long it held').click()
    await page.getByLabel('Gauge shows').fill('10')
    await page.getByLabel('Held for').fill('5')
    await page.getByRole('status').filter({ hasText: 'It held for 5 minutes.' }).getByText('Reached', { exact: true }).waitFor()
    await page.getByRole('button', { name: 'Record the recovery' }).click()
    await page.getByRole('list', { name: 'Lines of the tag' }).getByText('Net 37.9 lb (17.19 kg)').waitFor()

    // 65.4 lb and 27.5 lb in whole grams: 29,665 less 12,474.
    expect((await cylinderNow(shop.manager.client, cylinder.id)).contents).toMatchObject({ refrigerant: 'R-22', netGrams: 17191 })
    const [line] = (await shop.manager.client.get<CustodyLogAnswer>(`/api/cylinders/${cylinder.id}/events`)).body.items
    expect(line).toMatchObject({ kind: 'filled', details: {
      grossBefore: { unit: 'lb', value: 40 }, grossAfter: { unit: 'lb', value: 65.4 }, method: 'push-pull', looked: true, purged: true,
      readings: [{ gross: { unit: 'lb', value: 50.5 } }, { gross: { unit: 'lb', value: 65.5 } }], reached: { vacuum: { inHg: 10 }, heldMinutes: 5 },
    } })
    await page.goto(`${server.baseUrl}/now`, { waitUntil: 'networkidle' })
    expect(await page.getByText('a recovery beside the scale').count(), 'what is recorded is kept no longer').toBe(0)
    expect(said).toEqual([])
    await context.close()
  })

  it('goes on in pounds and ounces in two tabs as one, and shows itself to nobody else', async () => {
    const cylinder = await registered(shop, { contents: 'evacuated' })
    const address = `${server.baseUrl}/c/${cylinder.labelCode!.toLowerCase()}/recover`
    const context = await visit(browser, shop.technician.client)
    const page = await context.newPage()
    await page.goto(`${address}?refrigerant=R-22`, { waitUntil: 'networkidle' })
    await page.getByLabel('Weights in').selectOption('lb-oz')
    await press(page, '27')
    await page.getByRole('button', { name: 'lb, now the ounces' }).click()
    await press(page, '8')
    await page.getByRole('button', { name: 'Take 27 lb 8 oz' }).click()
    await page.getByRole('button', { name: 'Start filling' }).click()
    // 65.58 lb are 65 lb 9.28 oz.
    await page.getByText('Stop when the scale reads').waitFor()
    expect(await page.locator('main').innerText()).toMatch(/65\s*lb\s*9\s*oz/)

    const other = await context.newPage()
    await other.goto(`${server.baseUrl}/scan`, { waitUntil: 'networkidle' })
    await other.getByRole('link', { name: new RegExp(`${formatLabelCode(cylinder.labelCode!)}.*Go on with the recovery`) }).click()
    await other.getByText('No reading yet').waitFor()
    await page.keyboard.type('66.0')
    await page.keyboard.press('Enter')
    await page.getByRole('alert').filter({ hasText: 'Past the stop weight: shut the valve now.' }).waitFor()
    await other.getByRole('alert').filter({ hasText: 'Past the stop weight: shut the valve now.' }).waitFor()
    await other.getByRole('button', { name: 'Wrong figure: take back 66 lb 0 oz' }).click()
    await page.getByText('No reading yet').waitFor()

    const signIn = async ({ client }: Member) => {
      await context.clearCookies()
      await context.addCookies([...client.cookies].map(([name, value]) => ({ name, value, url: server.baseUrl })))
    }
    await signIn(shop.warehouse)
    await other.goto(address, { waitUntil: 'networkidle' })
    await other.getByRole('button', { name: 'Start filling' }).waitFor()
    await other.goto(`${server.baseUrl}/scan`, { waitUntil: 'networkidle' })
    expect(await other.getByText('Go on with the recovery').count()).toBe(0)

    await signIn(shop.technician)
    await other.goto(address, { waitUntil: 'networkidle' })
    await other.getByRole('button', { name: 'Stopped? Hoses off' }).click()
    await other.getByRole('button', { name: 'Put this recovery away' }).click()
    await other.getByRole('button', { name: 'Nothing went in: put it away' }).click()
    await other.getByRole('button', { name: 'Start filling' }).waitFor()
    await page.getByText('This recovery was recorded or put away in another tab.').waitFor()
    await context.close()
  })

  it('begins, opens again and ends without signal, with the tag\'s text, and is recorded once there is signal', async () => {
    const cylinder = await registered(shop)
    const door = await openFrontDoor(server.baseUrl)
    const context = await browser.newContext({ viewport: PHONE })
    await context.addCookies([...shop.manager.client.cookies].map(([name, value]) => ({ name, value, url: door.baseUrl })))
    await firstVisit(context, door.baseUrl)
    door.state = 'cut'

    const address = `${door.baseUrl}/c/${cylinder.labelCode!.toLowerCase()}/recover`
    const before = await context.newPage()
    await before.goto(address)
    await before.getByRole('button', { name: 'As last weighed: 40.0 lb' }).click()
    await before.getByRole('button', { name: 'Start filling' }).click()
    await press(before, '50')
    await before.getByRole('button', { name: 'Note 50.0 lb' }).click()
    await before.getByText('1 reading, kept').waitFor()
    await before.close()

    const page = await context.newPage()
    await page.goto(address)
    await page.getByRole('button', { name: 'Take back 50.0 lb' }).waitFor()
    await page.getByRole('button', { name: 'Stopped? Hoses off' }).click()
    await page.getByRole('button', { name: 'Hoses are off: weigh it' }).click()
    await press(page, '49.9')
    await page.getByRole('button', { name: 'Take 49.9 lb' }).click()
    await page.getByRole('button', { name: 'Record the recovery' }).click()
    await page.getByText('Saved on this phone', { exact: true }).first().waitFor()
    await page.getByRole('list', { name: 'Lines of the tag' }).getByText('Net 22.4 lb (10.16 kg)').waitFor()
    expect((await cylinderNow(shop.manager.client, cylinder.id)).contents.netGrams).toBe(5670)

    door.state = 'open'
    await page.goto(`${door.baseUrl}/scan`)
    // 49.9 lb and 27.5 lb in whole grams: 22,634 less 12,474.
    await expect.poll(async () => (await cylinderNow(shop.manager.client, cylinder.id)).contents.netGrams, { timeout: 25_000 }).toBe(10160)
    await context.close()
    await door.close()
  })
})
