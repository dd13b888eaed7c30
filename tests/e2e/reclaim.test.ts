import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CylinderView } from '../../utils/custody/cylinderView'
import type { SettlementAnswer } from '../../utils/contract/settlement'
import type { ShipmentWithLines } from '../../utils/contract/shipments'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import { cylinderNow, made, openShop, registered, type Shop } from '../helpers/fleet'
import { pdfTexts } from '../helpers/pdfText'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'
import { DESK, PHONE, visit } from '../helpers/visit'

let server: TestServer
let shop: Shop
let browser: Browser
let desk: { page: Page, context: BrowserContext }
/** Three of R-22 with a tare of 27.5 lb: 12.5 lb, 12.5 lb and 32.5 lb net. */
let full: CylinderView[]
const errors: string[][] = []

/** What a step leaves for the next. */
let shipmentId: string
let link: string

beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  const { manager, reclaimer } = shop
  full = [await registered(shop), await registered(shop), await registered(shop, { gross: lb(60) })]
  await made(manager.client, `/api/firms/${reclaimer.id}/terms`, {
    fromDay: '2026-01-01',
    terms: {
      refrigerants: [{ designation: 'R-22', conditions: ['clean', 'suspect'] }], takesMixed: false, takesUnknown: false, takesOverdue: true,
      specs: null, pressuresPsig: null, mostContaminationPercent: null, minimum: lb(50), minimumCylinders: null, pickUpCents: 2000, note: null,
    },
  })
  await made(manager.client, `/api/firms/${reclaimer.id}/prices`, { refrigerant: 'R-22', condition: 'clean', fromDay: '2026-01-01', mills: 2500, per: 'lb' })
  browser = await launchBrowser()
  desk = await opened(await visit(browser, manager.client, { viewport: DESK }))
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function opened(context: BrowserContext) {
  errors.push(listenForErrors(context))
  return { context, page: await context.newPage() }
}

const nameOf = ({ labelCode }: CylinderView) => formatLabelCode(labelCode!)
const shipmentNow = async () => (await shop.manager.client.get<ShipmentWithLines>(`/api/shipments/${shipmentId}`)).body
const settlementNow = async () => (await shop.manager.client.get<SettlementAnswer>(`/api/shipments/${shipmentId}/settlement`)).body

/** Three pounds of R-22 that the reclaimer's scale did not find. */
const ARGUED = 1
const THEIR_GROSS = [40, 37, 60]
const ACCEPTED = [12.5, 9.5, 32.5]

describe('from full cylinders to a closed settlement', () => {
  it('says what is worth shipping, and begins the shipment from there', async () => {
    const { page } = desk
    await page.goto(`${server.baseUrl}/reclaim`, { waitUntil: 'networkidle' })
    // 57.5 lb at 2.50 a pound, less 20.00 for the pick-up.
    const offer = page.getByRole('region', { name: `${shop.reclaimer.name}, ${shop.shop.name}` })
    expect(await offer.innerText()).toMatch(/57\.5/)
    expect(await offer.innerText()).toMatch(/143\.75/)
    await offer.getByRole('button', { name: /^Start a shipment/ }).click()
    await page.waitForURL(/\/shipments\/[0-9a-f-]{36}$/)
    shipmentId = page.url().split('/').at(-1)!
    expect((await shipmentNow()).lines).toHaveLength(3)
  })

  it('is weighed cylinder by cylinder, made ready, and leaves with its papers', async () => {
    const { page } = desk
    await page.getByLabel('Carried by').selectOption({ label: 'Our own vehicle' })
    await page.getByRole('link', { name: 'Scan and weigh' }).click()
    await page.waitForURL(/\/weigh$/, { waitUntil: 'networkidle' })
    for (const [index, cylinder] of full.entries()) {
      const typing = page.getByRole('button', { name: 'Type the code or the serial' })
      if (await typing.isVisible()) await typing.click()
      await page.getByLabel('Nine characters of the label').fill(cylinder.labelCode!)
      const gross = index === 2 ? '60' : '40'
      await page.getByLabel('The scale shows, pounds').fill(gross)
      await page.getByRole('button', { name: `Keep ${gross}` }).click()
      await page.getByText(`${index + 1} of 3 weighed, for`).waitFor()
    }
    await page.getByRole('link', { name: 'All are weighed: on to the shipment' }).click()
    await page.getByRole('button', { name: 'It is ready' }).click()
    await page.getByRole('button', { name: 'Dispatch 3 cylinders' }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Ship 3 cylinders' }).click()
    await page.getByText('Print this list').waitFor()
    expect(await shipmentNow()).toMatchObject({ state: 'dispatched', cylinders: 3 })

    const pdf = await page.request.get(`${server.baseUrl}/api/shipments/${shipmentId}/papers.pdf`)
    const [paper] = pdfTexts(await pdf.body())
    // 49 CFR 172.101: the row of R-22. Three cylinders, 140 lb with their tares.
    expect(paper).toContain('UN1018, Refrigerant gas R 22, 2.2')
    expect(paper).toMatch(/140(\.0)? lb/)
    expect(paper).toContain('+1 555 0142')
    expect(paper).not.toMatch(/draft/i)
  })

  it('is ticked off and weighed at the dock over a link, by somebody without an account, also while the signal is gone', async () => {
    const { page } = desk
    await page.getByRole('button', { name: 'Make a link' }).click()
    const mailed = page.getByLabel('Send it by mail')
    if (await mailed.isChecked()) await mailed.uncheck()
    await page.getByRole('button', { name: 'Make the link' }).click()
    link = /https?:\/\/\S+\/d\/\S+/.exec(await page.getByText(/\/d\//).innerText())![0]

    const dock = await opened(await visit(browser, null, { viewport: PHONE }))
    await dock.page.goto(link, { waitUntil: 'networkidle' })
    await dock.page.getByLabel('Your name').fill('Rhea at gate 2')
    await dock.page.getByRole('button', { name: 'Begin' }).click()
    for (const [index, cylinder] of full.entries()) {
      if (index === 2) await dock.context.setOffline(true)
      await dock.page.getByLabel('Serial or label code').fill(cylinder.labelCode!)
      await dock.page.getByRole('button', { name: 'Find' }).click()
      await dock.page.getByRole('region', { name: 'Gross on your scale' }).waitFor()
      // Ours is told only once theirs is entered.
      expect(await dock.page.locator('main').innerText()).not.toMatch(/\b(40|60)(\.0)? lb/)
      await dock.page.keyboard.type(String(THEIR_GROSS[index]))
      await dock.page.getByRole('button', { name: `Enter ${THEIR_GROSS[index]}` }).click()
      await dock.page.getByRole('region', { name: 'Weights' }).waitFor()
      await dock.page.getByRole('button', { name: 'Grade, net' }).click()
      const form = dock.page.getByRole('dialog')
      await form.getByLabel('Grade').fill('A')
      await form.getByLabel('Accepted net').fill(String(ACCEPTED[index]))
      await form.getByRole('button', { name: 'Enter it' }).click()
      await dock.page.getByText('accepted net').first().waitFor()
      await dock.page.getByRole('button', { name: 'All cylinders' }).click()
    }
    await dock.page.getByText(/3 of 3 here, 3 weighed/).waitFor()
    const isTold = ({ lines }: SettlementAnswer) => lines.filter(({ dock: said }) => said?.theirGross).length
    expect(isTold(await settlementNow())).toBe(2)
    await dock.context.setOffline(false)
    await expect.poll(async () => isTold(await settlementNow()), { timeout: 30_000 }).toBe(3)
    expect((await shipmentNow()).state).toBe('arrived')
    await dock.context.close()
  })

  it('opens a dispute where the weights differ, settles, and stays open while it is argued', async () => {
    const { page } = desk
    await page.goto(`${server.baseUrl}/shipments/${shipmentId}/settlement`, { waitUntil: 'networkidle' })
    await page.getByRole('button', { name: 'Enter figures' }).click()
    for (const [index, cylinder] of full.entries()) {
      // What the dock entered and what the price list says stand in the boxes.
      expect(await page.getByLabel(`Their gross of ${nameOf(cylinder)}`).inputValue()).toMatch(new RegExp(`^${THEIR_GROSS[index]}(\\.0)?$`))
      expect(await page.getByLabel(`Price of ${nameOf(cylinder)}`).inputValue()).toMatch(/^2\.50?$/)
    }
    await page.getByRole('button', { name: 'Leave what was typed' }).click()

    await page.getByRole('button', { name: 'Change it' }).click()
    await page.getByLabel('Number', { exact: true }).fill('T-2291')
    await page.getByLabel('Stated total').fill('116.25')
    await page.getByRole('button', { name: 'Add an amount' }).click()
    await page.getByLabel('What amount 1 is for').fill('Pick-up')
    await page.getByLabel('Amount 1', { exact: true }).fill('-20.00')
    await page.getByRole('button', { name: 'Save the statement' }).click()
    // 12.5, 9.5 and 32.5 lb at 2.50 are 31.25, 23.75 and 81.25.
    await page.getByText('To the cent').waitFor()
    expect(await settlementNow()).toMatchObject({ credit: { linesCents: 13_625, totalCents: 11_625, differenceCents: 0 } })

    await page.getByRole('button', { name: 'Settle the shipment' }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Settle it' }).click()
    await page.getByRole('button', { name: 'Close the shipment' }).waitFor()
    expect(await page.getByRole('button', { name: 'Close the shipment' }).isDisabled()).toBe(true)
    const argued = (await settlementNow()).disputes.filter(({ isOpen }) => isOpen)
    expect(argued.map(({ about, cylinderId }) => [about, cylinderId]).sort()).toEqual([['gross', full[ARGUED]!.id], ['net', full[ARGUED]!.id]])
    expect((await cylinderNow(shop.auditor.client, full[0]!.id)).contents).toMatchObject({ refrigerant: null, netGrams: 0 })
  })

  it('ends what is argued with a word and a reason, and is closed', async () => {
    const { page } = desk
    const open = page.getByRole('button', { name: 'End the dispute' })
    await page.getByLabel('Say something').first().fill('Your scale read 37 lb; ours read 40 lb an hour before it left.')
    await page.getByRole('button', { name: 'Say it' }).first().click()
    await page.getByRole('list', { name: 'What was said' }).getByText('ours read 40 lb').waitFor()
    for (let left = 2; left > 0; left--) {
      await page.getByLabel('How it ends').first().selectOption({ index: 1 })
      await page.getByLabel('Why', { exact: true }).first().fill('The valve leaked on the way; the driver said so.')
      await open.first().click()
      await expect.poll(() => open.count()).toBe(left - 1)
    }
    await page.getByRole('button', { name: 'Close the shipment' }).click()
    await expect.poll(async () => (await shipmentNow()).state).toBe('closed')
    await page.getByText(/Closed /).first().waitFor()

    // The dock reads what stands, and says nothing more.
    const dock = await opened(await visit(browser, null, { viewport: PHONE }))
    await dock.page.goto(link, { waitUntil: 'networkidle' })
    expect(await dock.page.getByRole('button', { name: 'Scan a label' }).count()).toBe(0)
    await dock.context.close()
  })

  it('tells the auditor who said what, down to the name at the dock', async () => {
    const { page, context } = await opened(await visit(browser, shop.auditor.client, { viewport: DESK }))
    await page.goto(`${server.baseUrl}/c/${full[ARGUED]!.labelCode}/log`, { waitUntil: 'networkidle' })
    const told = (await page.locator('main').innerText()).replace(/\s+/g, ' ')
    expect(told).toMatch(/Reclaimed taken over by the reclaimer, accepted 9\.5 lb net, grade A, reported at the dock by Rhea at gate 2 Mona 37\.0 −12\.5 0\.0/)
    await page.goto(`${server.baseUrl}/shipments/${shipmentId}`, { waitUntil: 'networkidle' })
    expect(await page.locator('main').innerText()).toContain('Rhea at gate 2')
    await context.close()
  })

  it('says nothing of errors on any page on the way', () => {
    // A phone without signal says so in its own console.
    expect(errors.flat().filter(text => !/ERR_INTERNET_DISCONNECTED|Failed to fetch/.test(text))).toEqual([])
  })
})
