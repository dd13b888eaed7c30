import { PrecacheController, type PrecacheEntry } from 'workbox-precaching'

declare const self: ServiceWorkerGlobalScope & { __WB_MANIFEST: PrecacheEntry[] }

/** The page that is every page without the server: it holds nobody's data. */
const SHELL = '/shell'
/** How long the server may take over a page before the one on the device is shown. */
const PATIENCE_MS = 3_000
/** Files of the version before, for windows that were opened with it. */
const OUTGOING = 'collarbook-outgoing'
/** Where these are kept under their own address: their name changes with what is in them. */
const NAMED_BY_CONTENT = '/_nuxt/'
/** What a proxy says when the server behind it is not there. */
const NOBODY_BEHIND = [502, 503, 504]

// Only files of the application are ever kept here: no page drawn for a person, and no answer of the API.
const files = new PrecacheController()
files.addToCacheList(self.__WB_MANIFEST)

self.addEventListener('install', event => void files.install(event))

self.addEventListener('activate', event => event.waitUntil((async () => {
  await keepOutgoing()
  await files.activate(event)
  await self.registration.navigationPreload?.enable()
  await self.clients.claim()
})()))

// Said by a person who takes the new version; by itself it waits until no window is open.
self.addEventListener('message', (event) => {
  if (event.data === 'take over') void self.skipWaiting()
})

self.addEventListener('fetch', (event) => {
  const { request } = event
  const { origin, pathname } = new URL(request.url)
  if (request.method !== 'GET' || origin !== self.location.origin || pathname.startsWith('/api/')) return
  if (request.mode === 'navigate') event.respondWith(pageOrShell(event))
  else if (files.getCacheKeyForURL(request.url) || pathname.startsWith(NAMED_BY_CONTENT)) event.respondWith(fileOf(request))
})

/** The page as the server draws it; where that takes too long or fails, the shell, which draws it from what is kept here. */
async function pageOrShell(event: FetchEvent): Promise<Response> {
  const shell = () => files.matchPrecache(SHELL)
  if (!self.navigator.onLine) return await shell() ?? fetch(event.request)
  const page = pageFromServer(event)
  const answer = await Promise.race([page.catch(() => null), after(PATIENCE_MS)])
  if (answer && !NOBODY_BEHIND.includes(answer.status)) return answer
  return await shell() ?? page
}

async function pageFromServer(event: FetchEvent): Promise<Response> {
  return await event.preloadResponse as Response | undefined ?? fetch(event.request)
}

/** A file of this version, of the one that waits or of the one before: a window uses those that it was opened with. */
async function fileOf(request: Request): Promise<Response> {
  return await files.matchPrecache(request.url) ?? await caches.match(request, { ignoreVary: true }) ?? fetch(request)
}

/** Before the files of the version that ends are cleared away, those that its open windows may still ask for are put aside. */
async function keepOutgoing() {
  await caches.delete(OUTGOING)
  const [kept, outgoing] = await Promise.all([caches.open(files.strategy.cacheName), caches.open(OUTGOING)])
  const current = new Set(files.getURLsToCacheKeys().values())
  for (const request of await kept.keys()) {
    if (current.has(request.url) || !new URL(request.url).pathname.startsWith(NAMED_BY_CONTENT)) continue
    const file = await kept.match(request)
    if (file) await outgoing.put(request, file)
  }
}

function after(ms: number): Promise<null> {
  return new Promise(done => setTimeout(done, ms, null))
}
