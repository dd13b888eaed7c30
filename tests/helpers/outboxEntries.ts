import type { Page } from 'playwright-core'

/** Puts into a page's outbox one refused entry of its person that is a day old, one of somebody else, and one that was dropped. */
export async function fillOutbox(page: Page, cylinder: string): Promise<void> {
  await page.evaluate(async (reference) => {
    const { user } = await (await fetch('/api/session')).json() as { user: { id: string } }
    const database = await new Promise<IDBDatabase>((done, failed) => {
      const opening = indexedDB.open('collarbook-outbox', 1)
      opening.onsuccess = () => done(opening.result)
      opening.onerror = () => failed(opening.error)
      // What the application makes when it comes first.
      opening.onupgradeneeded = () => {
        for (const store of ['entries', 'recorded', 'dropped']) opening.result.createObjectStore(store, { keyPath: 'id' })
        opening.result.createObjectStore('device')
      }
    })
    const aDayAgo = Date.now() - 25 * 3_600_000
    const entry = (id: string, personId: string, deviceSeq: number) => ({
      id, personId, queuedAt: aDayAgo, state: 'refused', tries: 1, firstSentAt: null, shape: 1,
      problem: { type: 'about:blank', title: 'It names what nobody knows', status: 422, detail: 'Choose again from the list.', errors: [{ path: 'placeId', message: 'no such place' }] },
      event: { id, cylinderId: reference, kind: 'weighed', occurredAt: new Date(aDayAgo).toISOString(), deviceId: 'd', deviceSeq, details: { gross: { value: 40, unit: 'lb' } } },
    })
    const writing = database.transaction(['entries', 'dropped'], 'readwrite')
    writing.objectStore('entries').put(entry('mine', user.id, 1))
    writing.objectStore('entries').put(entry('theirs', 'somebody else', 2))
    writing.objectStore('dropped').put({ ...entry('given-up', user.id, 3), droppedAt: aDayAgo, reason: 'weighed twice' })
    await new Promise<void>((done) => {
      writing.oncomplete = () => done()
    })
    database.close()
    localStorage.setItem('collarbook-outbox-waits', '1')
  }, cylinder)
  await page.reload({ waitUntil: 'networkidle' })
  await page.getByRole('heading', { name: '1 refused' }).waitFor()
}
