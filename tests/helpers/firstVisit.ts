import type { BrowserContext } from 'playwright-core'
import { expect } from 'vitest'

/** The visit that puts the application and the copy of the fleet onto a phone. */
export async function firstVisit(context: BrowserContext, baseUrl: string): Promise<void> {
  const page = await context.newPage()
  await page.goto(`${baseUrl}/van`)
  await page.evaluate(() => navigator.serviceWorker.ready.then(() => undefined))
  await expect.poll(() => page.evaluate(cylindersKept), { timeout: 20_000 }).toBeGreaterThan(0)
  await page.close()
}

/** How many cylinders the copy on the device has. */
function cylindersKept(): Promise<number> {
  return new Promise((done, failed) => {
    const opening = indexedDB.open('collarbook-kit')
    opening.onerror = () => failed(opening.error)
    opening.onsuccess = () => {
      const box = opening.result
      if (!box.objectStoreNames.contains('cylinders')) return done(0)
      const counting = box.transaction('cylinders').objectStore('cylinders').count()
      counting.onsuccess = () => {
        box.close()
        done(counting.result)
      }
    }
  })
}
