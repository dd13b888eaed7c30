import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CylinderPhotosAnswer } from '../../utils/contract/uploads'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { launchBrowser, listenForErrors } from '../helpers/browser'
import type { TestClient } from '../helpers/client'
import { openShop, registered, type Shop } from '../helpers/fleet'
import { png } from '../helpers/pictures'
import { startServer, type TestServer } from '../helpers/server'
import { visit } from '../helpers/visit'

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

/** A picture as large as a phone takes it: it is made smaller before it is sent. */
const LARGE = { name: 'IMG_0001.png', mimeType: 'image/png', buffer: Buffer.from(png(2600, 1300, x => [x % 256, 120, 60])) }
const photosOf = async (client: TestClient, id: string) => (await client.get<CylinderPhotosAnswer>(`/api/cylinders/${id}/photos`)).body.items

async function onPage(client: TestClient): Promise<{ page: Page, said: string[], close: () => Promise<void> }> {
  const context = await visit(browser, client)
  const said = listenForErrors(context)
  return { page: await context.newPage(), said, close: () => context.close() }
}

describe('a photo of the scale', () => {
  let cylinder: CylinderView
  beforeAll(async () => {
    cylinder = await registered(shop)
  })

  it('does not hold up the weighing: that is recorded without signal for the photo, which comes later by itself and shows', async () => {
    const { client } = shop.technician
    const { page, said, close } = await onPage(client)
    // The network takes small requests and breaks off large ones.
    await page.route('**/api/uploads', route => route.abort())
    await page.goto(`${server.baseUrl}/c/${cylinder.id}/act/weighed`, { waitUntil: 'networkidle' })
    await page.getByLabel('Take a photo').setInputFiles(LARGE)
    await page.getByRole('list', { name: 'Photos taken' }).getByRole('listitem').waitFor()

    // A page that is closed before it is recorded loses nothing.
    await page.reload({ waitUntil: 'networkidle' })
    await page.getByRole('list', { name: 'Photos taken' }).getByRole('listitem').waitFor()
    await page.locator('#act input[inputmode="decimal"]').first().fill('39')
    await page.getByRole('button', { name: /^Record/ }).click()
    await page.getByText('Recorded: weighed').first().waitFor()
    await page.getByText('1 photo waits on this device and goes when there is signal.').waitFor()
    expect(await photosOf(client, cylinder.id)).toMatchObject([{ photos: [], onTheWay: 1 }])

    await page.goto(`${server.baseUrl}/c/${cylinder.id}/log`, { waitUntil: 'networkidle' })
    await page.locator('text=Photo on its way >> visible=true').waitFor()
    await page.unroute('**/api/uploads')
    await page.getByRole('button', { name: 'Send now' }).click()

    const thumb = page.locator('img[alt^="Photo of the scale"] >> visible=true').first()
    await thumb.waitFor()
    await thumb.click()
    const dialog = page.getByRole('dialog')
    await dialog.getByText('by the phone\'s clock').waitFor()
    // As large as it is kept, and drawn.
    expect(await dialog.locator('img').evaluate(async (image: HTMLImageElement) => {
      await image.decode()
      return [image.naturalWidth, image.naturalHeight]
    })).toEqual([2048, 1024])
    await page.keyboard.press('Escape')
    await dialog.waitFor({ state: 'hidden' })

    expect(await photosOf(client, cylinder.id)).toMatchObject([{ onTheWay: 0, photos: [{ subject: 'scale', by: { name: 'Tina' }, putAt: null }] }])
    await page.goto(`${server.baseUrl}/c/${cylinder.id}`, { waitUntil: 'networkidle' })
    await page.getByRole('region', { name: 'Photos' }).getByRole('button').waitFor()
    // Only what was broken off on purpose.
    expect(said.filter(text => !/ERR_FAILED/.test(text))).toEqual([])
    await close()
  })

  it('is put to a line that is recorded, by a manager, and says so', async () => {
    const { page, said, close } = await onPage(shop.manager.client)
    await page.goto(`${server.baseUrl}/c/${cylinder.id}/log`, { waitUntil: 'networkidle' })
    await page.locator('button:has-text("Add a photo") >> visible=true').first().click()
    const dialog = page.getByRole('dialog')
    await dialog.getByLabel('Choose photos').setInputFiles([LARGE])
    await dialog.getByLabel('What photo 1 shows').selectOption({ label: 'Damage' })
    await dialog.getByRole('button', { name: 'Send the photo' }).click()
    await page.locator('img[alt^="Photo of the damage"] >> visible=true').first().click()
    await page.getByRole('dialog').getByText('after it was recorded').waitFor()
    const [item] = await photosOf(shop.manager.client, cylinder.id)
    expect(item!.photos.at(-1)).toMatchObject({ subject: 'damage', by: { name: 'Mona' }, putAt: expect.any(String) })
    expect(said).toEqual([])
    await close()
  })

  it('is said not to be one where the file is none', async () => {
    const { page, close } = await onPage(shop.technician.client)
    await page.goto(`${server.baseUrl}/c/${cylinder.id}/act/weighed`, { waitUntil: 'networkidle' })
    await page.getByLabel('Choose photos').setInputFiles({ name: 'photo.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('<html>') })
    await page.getByText('This file is no picture that can be shown.').waitFor()
    expect(await page.getByRole('list', { name: 'Photos taken' }).count()).toBe(0)
    await close()
  })
})
