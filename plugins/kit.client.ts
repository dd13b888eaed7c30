import { useSessionStore } from '~~/stores/session'

/** The first visit's own page comes first: the copy is looked after once it stands. Units: milliseconds. */
const AFTER_PAGE_MS = 2_000

/** Whoever is signed in has a copy of the firm on this device, which follows the server. */
export default defineNuxtPlugin((nuxt) => {
  nuxt.hook('app:mounted', () => {
    const session = useSessionStore()
    let timer: ReturnType<typeof setTimeout> | undefined
    watch(() => session.user?.id, (id) => {
      clearTimeout(timer)
      if (id !== undefined) timer = setTimeout(() => void begin(), AFTER_PAGE_MS)
    }, { immediate: true })
  })

  async function begin() {
    const { useKitStore } = await import('~~/stores/kit')
    await nuxt.runWithContext(() => useKitStore().start())
  }
})
