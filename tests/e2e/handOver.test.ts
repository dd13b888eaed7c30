import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { formatLabelCode } from '../../utils/label/code'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import { filmOfCode } from '../helpers/fakeCamera'
import { addMember, type Member } from '../helpers/firm'
import { cylinderNow, eventOf, openShop, posted, registered, type Shop } from '../helpers/fleet'
import { firstVisit } from '../helpers/firstVisit'
import { openFrontDoor } from '../helpers/frontDoor'
import { lb } from '../helpers/stamps'
import { startServer, type TestServer } from '../helpers/server'
import { PHONE, visit } from '../helpers/visit'

let server: TestServer
let shop: Shop
let second: Member
let browser: Browser
let camera: Browser | undefined
let folder: string

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'collarbook-handover-'))
  server = await startServer()
  shop = await openShop(server)
  second = await addMember(shop.admin, 'Nils', ['technician'])
  browser = await launchBrowser()
})
afterAll(async () => {
  await Promise.all([browser?.close(), camera?.close()])
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

it('two cylinders go from phone to phone by a scan, the second without signal; nothing that is found is hidden, and the first reads the answer', async () => {
  const sound = await registered(shop)
  // TW 27.5 and a limit of 38.08 lb: at 70 lb it is overfilled.
  const overfilled = await registered(shop, { gross: lb(70) })
  await posted(shop.warehouse.client, [sound, overfilled].map(({ id }) => ({ ...eventOf(id, 'handed-over'), details: { toHolderId: shop.technician.id } })))

  const first = await visit(browser, shop.technician.client)
  const said = listenForErrors(first)
  const giver = await first.newPage()
  await giver.goto(`${server.baseUrl}/hand-over`, { waitUntil: 'networkidle' })
  for (const { labelCode } of [sound, overfilled]) await giver.getByLabel(formatLabelCode(labelCode!)).check()
  await giver.getByRole('button', { name: 'Show the code for these 2' }).click()
  await giver.getByText('As letters, for a phone without a camera').click()
  filmOfCode(await giver.getByText(/^CYLINDERS1\/O\//).innerText(), join(folder, 'offer.y4m'))

  camera = await launchBrowser({ cameraFilm: join(folder, 'offer.y4m') })
  const door = await openFrontDoor(server.baseUrl)
  const context = await camera.newContext({ viewport: PHONE, permissions: ['camera'] })
  await context.addCookies([...second.client.cookies].map(([name, value]) => ({ name, value, url: door.baseUrl })))
  await firstVisit(context, door.baseUrl)
  door.state = 'cut'
  const taker = await context.newPage()
  await taker.goto(`${door.baseUrl}/scan`)
  await taker.getByRole('status').filter({ hasText: 'Tina hands over 2 cylinders.' }).waitFor({ timeout: 30_000 })
  const offered = taker.getByRole('list', { name: 'Cylinders' }).getByRole('listitem')
  await offered.filter({ hasText: formatLabelCode(overfilled.labelCode!) }).getByText(/^Stop: /).first().waitFor()
  await taker.getByRole('button', { name: 'I have these 2 now' }).click()
  await taker.getByRole('status').filter({ hasText: 'You have what Tina handed over.' }).waitFor()
  await taker.getByText('As letters, for a phone without a camera').click()
  const answer = await taker.getByText(/^CYLINDERS1\/A\//).innerText()
  await taker.getByText('You have it now, saved on this phone').nth(1).waitFor()

  await giver.getByText('Type or paste the other phone’s letters').click()
  await giver.getByLabel('Its letters').fill(answer)
  await giver.getByRole('button', { name: 'Read them' }).click()
  await giver.getByText('Nils has 2 of them now.').waitFor()
  await giver.getByRole('list', { name: 'Offered' }).getByText('gone from you').nth(1).waitFor()

  // Scanned once more it is not recorded once more.
  await taker.goto(`${door.baseUrl}/scan`)
  await taker.getByText('You hold it already.').nth(1).waitFor({ timeout: 30_000 })
  expect(await taker.getByRole('button', { name: /now$/ }).count()).toBe(0)
  expect((await cylinderNow(shop.manager.client, sound.id)).holder).toMatchObject({ id: shop.technician.id })
  door.state = 'open'
  await taker.goto(`${door.baseUrl}/van`)
  for (const { id } of [sound, overfilled]) {
    await expect.poll(async () => (await cylinderNow(shop.manager.client, id)).holder?.id, { timeout: 25_000 }).toBe(second.id)
  }
  expect(said).toEqual([])
  await Promise.all([context.close(), first.close()])
  await door.close()
})
