import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CustodyLogAnswer, FleetAnswer } from '../../utils/contract/custody'
import type { MintAnswer } from '../../utils/contract/labels'
import type { Place } from '../../utils/contract/places'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import type { TestClient } from '../helpers/client'
import { cylinderNow, eventOf, made, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { FRENCH, GERMAN, handScanner } from '../helpers/handScanner'
import { startServer, type TestServer } from '../helpers/server'
import { lb } from '../helpers/stamps'
import { visit } from '../helpers/visit'

const CODE_FIELD = 'Nine characters of the label'

let server: TestServer
let shop: Shop
let van: Place
let rack: Place
let browser: Browser

beforeAll(async () => {
  server = await startServer()
  shop = await openShop(server)
  van = await made<Place>(shop.admin.client, '/api/places', { name: 'Van 3', kind: 'van', technicianId: shop.technician.id })
  rack = await made<Place>(shop.admin.client, '/api/places', { name: 'Rack 2', kind: 'rack', parentId: shop.shop.id })
  browser = await launchBrowser()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function onPage(client: TestClient, path: string): Promise<{ page: Page, context: BrowserContext, said: string[] }> {
  const context = await visit(browser, client)
  const said = listenForErrors(context)
  const page = await context.newPage()
  await page.goto(`${server.baseUrl}${path}`, { waitUntil: 'networkidle' })
  return { page, context, said }
}

function addressOf(code: string): string {
  return `${server.baseUrl}/C/${code}`.toUpperCase()
}

/** Registered, labelled, and moved to the rack. */
async function onTheRack(count: number): Promise<CylinderView[]> {
  const views = await Promise.all(Array.from({ length: count }, () => registered(shop)))
  return posted(shop.warehouse.client, views.map(({ id }) => ({ ...eventOf(id, 'moved'), details: { toPlaceId: rack.id } })))
}

function lineOf(page: Page, view: CylinderView) {
  return page.getByRole('listitem').filter({ has: page.getByRole('button', { name: `Take ${formatLabelCode(view.labelCode!)} off the list` }) })
}

async function atPlace(place: Place): Promise<string[]> {
  return (await shop.manager.client.get<FleetAnswer>(`/api/cylinders?place=${place.id}&limit=200`)).body.items.map(({ id }) => id).sort()
}

describe('loading a van with twelve from a rack', () => {
  let twelve: CylinderView[]
  let stray: CylinderView

  it('tells a wrong one at once, names the missing one, and puts the others aboard by one act', async () => {
    twelve = await onTheRack(12)
    stray = await registered(shop)
    const { page, context, said } = await onPage(shop.technician.client, `/batch?act=load&van=${van.id}&from=${rack.id}`)
    const scanner = await handScanner(page)
    await page.getByText('Expected 12: 0 scanned, 12 missing').waitFor()

    const [lost, ...present] = twelve
    for (const view of present.slice(0, 6)) {
      await scanner.scan(addressOf(view.labelCode!), { enter: true })
      await lineOf(page, view).getByText(/R-22, room/).waitFor()
    }
    await scanner.scan(addressOf(stray.labelCode!), { enter: true })
    await page.getByRole('alert').filter({ hasText: 'It is not on the list.' }).waitFor()
    // The stop stands until it was seen: what is scanned meanwhile is not taken.
    await scanner.scan(addressOf(present[6]!.labelCode!), { enter: true })
    await page.waitForTimeout(300)
    expect(await page.getByRole('button', { name: /off the list$/ }).count()).toBe(7)
    await lineOf(page, stray).getByRole('button', { name: 'Take it off' }).click()

    // A closed tab loses nothing.
    await page.close()
    const again = await context.newPage()
    await again.goto(`${server.baseUrl}/batch?act=load&van=${van.id}&from=${rack.id}`, { waitUntil: 'networkidle' })
    await again.getByText('6 on the list').waitFor()
    const scannerAgain = await handScanner(again)
    for (const view of present.slice(6)) {
      await scannerAgain.scan(addressOf(view.labelCode!), { enter: false })
      await lineOf(again, view).getByText(/R-22, room/).waitFor()
    }
    await again.getByText('Expected 12: 11 scanned, 1 missing').waitFor()
    const missing = again.getByRole('list', { name: 'Missing' })
    expect(await missing.innerText()).toContain(formatLabelCode(lost!.labelCode!))
    expect(await missing.innerText()).toContain('last at Rack 2')

    await again.getByRole('button', { name: 'Put 11 on Van 3' }).click()
    await again.getByText('11 put on Van 3').waitFor()
    // Whoever works by the keyboard goes on from the list, not from the top of the page.
    expect(await again.evaluate(() => document.activeElement!.textContent!.trim())).toBe('0 on the list')
    expect(await atPlace(van)).toEqual(present.map(({ id }) => id).sort())
    expect(await atPlace(rack)).toEqual([lost!.id])
    const aboard = (await shop.manager.client.get<CylinderView>(`/api/cylinders/${present[0]!.id}`)).body
    expect(aboard.holder?.id).toBe(shop.technician.id)

    await again.getByRole('button', { name: 'Take it back' }).click()
    await again.getByText('All 11 taken back.').waitFor()
    expect(await atPlace(rack)).toHaveLength(12)
    expect(said).toEqual([])
    await context.close()
  })

  it('checks against the very cylinders that it was asked for, by code and by id', async () => {
    const [one, two] = await onTheRack(2)
    const { page, context, said } = await onPage(shop.warehouse.client, `/batch?act=move&to=${van.id}&expect=${one!.labelCode},${two!.id}`)
    const scanner = await handScanner(page)
    await page.getByText('Expected 2: 0 scanned, 2 missing').waitFor()
    await scanner.scan(addressOf(stray.labelCode!), { enter: true })
    await page.getByRole('alert').filter({ hasText: 'It is not on the list.' }).waitFor()
    await lineOf(page, stray).getByRole('button', { name: 'Take it off' }).click()
    await scanner.scan(addressOf(two!.labelCode!), { enter: true })
    await page.getByText('Expected 2: 1 scanned, 1 missing').waitFor()
    expect(await page.getByRole('list', { name: 'Missing' }).innerText()).toContain(formatLabelCode(one!.labelCode!))
    await page.getByRole('button', { name: 'Move 1 to Van 3' }).click()
    await page.getByText('1 moved to Van 3').waitFor()
    expect(await Promise.all([one!, two!].map(async ({ id }) => (await cylinderNow(shop.manager.client, id)).place?.id))).toEqual([rack.id, van.id])
    expect(said).toEqual([])
    await context.close()
  })

  it('takes an overfilled one only with a reason, which stands in the log', async () => {
    const overfilled = await registered(shop, { gross: lb(70) })
    const { page, context } = await onPage(shop.technician.client, `/batch?act=load&van=${van.id}`)
    await page.getByLabel(CODE_FIELD).fill(overfilled.labelCode!)
    await page.getByRole('alert').filter({ hasText: 'Not this cylinder.' }).waitFor()
    await page.getByLabel('Or why it goes along all the same').fill('it was aboard already')
    await page.getByRole('button', { name: 'Keep it' }).click()
    await page.getByRole('button', { name: 'Put 1 on Van 3' }).click()
    await page.getByText('1 put on Van 3').waitFor()
    const { items } = (await shop.manager.client.get<CustodyLogAnswer>(`/api/cylinders/${overfilled.id}/events`)).body
    expect(items[0]).toMatchObject({ kind: 'moved', note: 'it was aboard already', confirmed: ['overfill'] })
    await context.close()
  })

  it('asks which one where a code is on two cylinders, and takes the one whose serial was read', async () => {
    const [one, two] = [await registered(shop), await registered(shop, { isLabelled: false })]
    await posted(shop.warehouse.client, [{ ...eventOf(two.id, 'labelled'), details: { code: one.labelCode } }])
    const { page, context } = await onPage(shop.technician.client, `/batch?act=load&van=${van.id}`)
    await page.getByLabel(CODE_FIELD).fill(one.labelCode!)
    await page.getByRole('alert').filter({ hasText: 'This code is on two cylinders' }).waitFor()
    expect(await page.getByRole('button', { name: 'Put 0 on Van 3' }).isDisabled()).toBe(true)
    await page.getByLabel('Last four of the serial on its collar').fill('ZZ99')
    await page.getByRole('button', { name: 'It is this one' }).click()
    await page.getByText('Neither of the two ends like that.').waitFor()
    await page.getByLabel('Last four of the serial on its collar').fill(two.stamp!.serial!)
    await page.getByRole('button', { name: 'It is this one' }).click()
    await page.getByRole('button', { name: 'Put 1 on Van 3' }).click()
    await page.getByText('1 put on Van 3').waitFor()
    expect(await atPlace(van)).toContain(two.id)
    expect(await atPlace(van)).not.toContain(one.id)
    await context.close()
  })
})

describe('a hand scanner that types', () => {
  it('opens the cylinder with Enter and without, on a German and on a French keyboard', async () => {
    const { page, context } = await onPage(shop.technician.client, '/scan')
    const scanner = await handScanner(page)
    const ways = [{ enter: true }, { enter: false }, { enter: true, layout: GERMAN }, { enter: false, layout: FRENCH }]
    for (const way of ways) {
      const view = await registered(shop)
      await scanner.scan(addressOf(view.labelCode!), way)
      await page.getByRole('region', { name: `Cylinder ${formatLabelCode(view.labelCode!)}` }).waitFor()
    }
    await context.close()
  })

  it('leaves a field as it was, and the focus in it', async () => {
    const view = await registered(shop)
    const { page, context } = await onPage(shop.technician.client, '/scan')
    const scanner = await handScanner(page)
    await page.getByRole('button', { name: 'By the stamp' }).click()
    const field = page.getByLabel('Last characters of the stamp')
    await field.fill('K48')
    await scanner.scan(addressOf(view.labelCode!), { enter: true })
    await page.getByRole('region', { name: `Cylinder ${formatLabelCode(view.labelCode!)}` }).waitFor()
    expect(await field.inputValue()).toBe('K48')
    expect(await field.evaluate(element => element === document.activeElement)).toBe(true)
    await context.close()
  })
})

describe('a label that was printed ahead', () => {
  it('is bound to a cylinder found by the end of its stamp', async () => {
    const bare = await registered(shop, { isLabelled: false, stamp: { serial: 'QX71044' } })
    await registered(shop, { isLabelled: false, stamp: { serial: 'QX81044' } })
    const { codes: [blank] } = await made<MintAnswer>(shop.warehouse.client, '/api/labels', { count: 1 })
    const { page, context } = await onPage(shop.technician.client, '/scan')
    for (const key of blank!) await page.getByRole('group', { name: 'Keys of a label code' }).getByRole('button', { name: key, exact: true }).click()
    await page.getByText('A label on no cylinder').waitFor()
    await page.getByRole('button', { name: 'Find its cylinder by the stamp' }).click()
    await page.getByLabel('Last characters of the stamp').fill('1044')
    await page.getByRole('button', { name: 'Find it', exact: true }).click()
    const hits = page.getByRole('list', { name: 'Cylinders with that stamp' })
    await hits.getByText('QX81044').waitFor()
    await hits.getByText('QX71044').click()
    await page.getByRole('button', { name: 'Record the label' }).click()
    await page.getByText('Recorded: labelled').first().waitFor()
    const bound = (await shop.technician.client.get<CylinderView>(`/api/cylinders/${blank}`)).body
    expect(bound).toMatchObject({ id: bare.id, labelCode: blank })
    await context.close()
  })
})

describe('a code typed by hand', () => {
  it('with a slip is not called wrong: what to compare is said, and the near code of the fleet offered', async () => {
    const view = await registered(shop)
    const code = view.labelCode!
    const slipped = code.slice(0, 8) + (code.endsWith('7') ? '8' : '7')
    const { page, context } = await onPage(shop.technician.client, '/scan')
    await page.getByLabel(CODE_FIELD).fill(slipped)
    await page.getByText(/The ninth character does not fit\. Compare/).waitFor()
    await page.getByRole('button', { name: formatLabelCode(code) }).click()
    await page.getByRole('region', { name: `Cylinder ${formatLabelCode(code)}` }).waitFor()
    await context.close()
  })
})
