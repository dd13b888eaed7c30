import type { Page } from 'playwright-core'

/** How many cylinders a phone's copy of the fleet has, or whether it has this one: 1 or 0. */
export function cylindersOnPhone(page: Page, id?: string): Promise<number> {
  return page.evaluate(counted, id)
}

function counted(id: string | undefined): Promise<number> {
  return new Promise((done) => {
    const opening = indexedDB.open('collarbook-kit')
    // Opened before the page has made it, it would be made without its parts.
    opening.onupgradeneeded = () => opening.transaction!.abort()
    opening.onerror = () => done(0)
    opening.onsuccess = () => {
      const counting = opening.result.transaction('cylinders').objectStore('cylinders').count(id)
      counting.onsuccess = () => {
        opening.result.close()
        done(counting.result)
      }
    }
  })
}
