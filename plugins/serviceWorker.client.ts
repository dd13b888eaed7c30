/** The first visit's own page comes before the files of all others. Units: milliseconds. */
const AFTER_PAGE_MS = 2_000

/**
 * Puts the application onto the device once the page stands, and keeps the browser's offer to install it for our own button.
 * All but the ear for that offer is fetched then: nothing of it is needed to show a page.
 */
export default defineNuxtPlugin((nuxt) => {
  let offered: WindowEventMap['beforeinstallprompt'] | null = null
  const hold = (event: WindowEventMap['beforeinstallprompt']) => {
    event.preventDefault()
    offered = event
  }
  window.addEventListener('beforeinstallprompt', hold)

  onNuxtReady(() => setTimeout(() => void begin(), AFTER_PAGE_MS))

  async function begin() {
    const found = await import('~~/stores/installation').catch(() => null)
    if (!found) return
    const installation = await nuxt.runWithContext(() => found.useInstallationStore())
    window.removeEventListener('beforeinstallprompt', hold)
    installation.listen(offered)
    await installation.register()
  }
})
