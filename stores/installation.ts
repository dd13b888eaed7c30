import { defineStore } from 'pinia'

/** What Chromium hands a page that may be installed; not in the DOM's types, since it is no standard yet. */
interface InstallPrompt extends Event { prompt(): Promise<{ outcome: 'accepted' | 'dismissed' }> }

declare global {
  interface WindowEventMap { beforeinstallprompt: InstallPrompt }
  interface Navigator { /** Of Safari on a phone. */ standalone?: boolean }
}

/** How this device keeps what the browser stores for us. */
export interface KeptStorage {
  /** Whether the browser clears it only when a person says so. */
  isPersisted: boolean
  usedBytes: number | null
  quotaBytes: number | null
}

const HOUR_MS = 3_600_000

/** The application as it lies on this device: its worker, the version that waits, its place on the home screen, its storage. */
export const useInstallationStore = defineStore('installation', () => {
  const waiting = shallowRef<ServiceWorker | null>(null)
  const prompt = shallowRef<InstallPrompt | null>(null)
  /** Whether the pages open without the server from now on. */
  const opensOffline = ref(false)
  const isInstalled = ref(false)
  const storage = ref<KeptStorage | null>(null)

  /** Safari on a phone lets nobody ask: its own menu does it. */
  const isByShareSheet = ref(false)

  const isUpdateReady = computed(() => waiting.value !== null)
  /** Whether the browser lets us ask. */
  const canInstall = computed(() => prompt.value !== null && !isInstalled.value)

  /** Installs the worker and looks for newer versions when the page is come back to, and each hour. */
  async function register() {
    if (import.meta.dev || !('serviceWorker' in navigator)) return
    const registration = await navigator.serviceWorker.register('/sw.js').catch(() => null)
    if (!registration) return
    const note = () => {
      // Without a worker in charge the one that waits is the first, and no newer version.
      waiting.value = navigator.serviceWorker.controller ? registration.waiting : null
    }
    const follow = (worker: ServiceWorker | null) => worker?.addEventListener('statechange', note)
    follow(registration.waiting)
    follow(registration.installing)
    registration.addEventListener('updatefound', () => follow(registration.installing))
    note()
    void navigator.serviceWorker.ready.then(() => {
      opensOffline.value = true
    })

    const look = () => void registration.update().catch(() => undefined)
    document.addEventListener('visibilitychange', () => document.visibilityState === 'visible' && look())
    setInterval(look, HOUR_MS)
  }

  /** Takes the version that waits, and opens this page anew with it. */
  function takeUpdate() {
    navigator.serviceWorker.addEventListener('controllerchange', () => location.reload(), { once: true })
    waiting.value?.postMessage('take over')
  }

  /** Hears what becomes of installing; `offered` is what the browser has offered already. */
  function listen(offered: InstallPrompt | null) {
    prompt.value = offered
    isInstalled.value = navigator.standalone === true || matchMedia('(display-mode: standalone)').matches
    isByShareSheet.value = !isInstalled.value && navigator.standalone === false
    window.addEventListener('beforeinstallprompt', (event) => {
      // Asked in our own words, where it is of use.
      event.preventDefault()
      prompt.value = event
    })
    window.addEventListener('appinstalled', () => {
      isInstalled.value = true
    })
  }

  async function install() {
    const asked = prompt.value
    // It asks once; the browser hands out another one when it may be asked again.
    prompt.value = null
    await asked?.prompt()
  }

  /** Asks the browser not to clear what is kept here when space runs out. Some browsers ask the person. */
  async function askToPersist() {
    await navigator.storage?.persist?.().catch(() => false)
    await lookAtStorage()
  }

  async function lookAtStorage() {
    if (!navigator.storage?.persisted) return
    const [isPersisted, estimate] = await Promise.all([navigator.storage.persisted(), navigator.storage.estimate()])
    storage.value = { isPersisted, usedBytes: estimate.usage ?? null, quotaBytes: estimate.quota ?? null }
  }

  return { isUpdateReady, opensOffline, isInstalled, isByShareSheet, canInstall, storage, register, takeUpdate, listen, install, askToPersist, lookAtStorage }
})
