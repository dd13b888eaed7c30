import type { BrowserContext } from 'playwright-core'
import { expect } from 'vitest'
import { cylindersOnPhone } from './copyOnPhone'

/** The visit that puts the application and the copy of the fleet onto a phone. */
export async function firstVisit(context: BrowserContext, baseUrl: string): Promise<void> {
  const page = await context.newPage()
  await page.goto(`${baseUrl}/van`)
  await page.evaluate(() => navigator.serviceWorker.ready.then(() => undefined))
  await expect.poll(() => cylindersOnPhone(page), { timeout: 20_000 }).toBeGreaterThan(0)
  await page.close()
}
