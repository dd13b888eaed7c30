import type { Browser, BrowserContext, BrowserContextOptions } from 'playwright-core'
import type { TestClient } from './client'

export const PHONE = { width: 412, height: 915 }
export const DESK = { width: 1440, height: 900 }

/** A fresh browser profile; with a client, the person who is signed in there is signed in here. */
export async function visit(browser: Browser, client: TestClient | null, options: BrowserContextOptions = {}): Promise<BrowserContext> {
  const context = await browser.newContext({ viewport: PHONE, timezoneId: 'America/Chicago', ...options })
  if (client) await context.addCookies([...client.cookies].map(([name, value]) => ({ name, value, url: client.baseUrl })))
  return context
}
