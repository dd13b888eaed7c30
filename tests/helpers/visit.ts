import type { Browser, BrowserContext, BrowserContextOptions } from 'playwright-core'
import type { TestClient } from './client'

export const PHONE = { width: 412, height: 915 }
export const DESK = { width: 1440, height: 900 }

/**
 * A fresh browser profile; with a client, the person who is signed in there is signed in here.
 *
 * The service worker is kept out, so that no test waits for two hundred files to be put by, and none is answered from them.
 * A test of what happens without the server lets it in by `serviceWorkers: 'allow'`.
 */
export async function visit(browser: Browser, client: TestClient | null, options: BrowserContextOptions = {}): Promise<BrowserContext> {
  const context = await browser.newContext({ viewport: PHONE, timezoneId: 'America/Chicago', serviceWorkers: 'block', ...options })
  if (client) await context.addCookies([...client.cookies].map(([name, value]) => ({ name, value, url: client.baseUrl })))
  return context
}
