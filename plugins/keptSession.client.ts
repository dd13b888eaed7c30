import { keepPerson } from '~~/composables/keptPerson'
import { useSessionStore } from '~~/stores/session'

/** Keeps on the device who is signed in, so that the next page opens without the server, and forgets it with the session. */
export default defineNuxtPlugin((nuxt) => {
  const session = useSessionStore()
  watch(() => session.user, (person) => {
    if (session.known) keepPerson(person)
  }, { immediate: true, deep: true })

  nuxt.hook('app:mounted', async () => {
    if (!session.isKept || !navigator.onLine || await session.confirm() !== 'ended') return
    // The page was opened from the device although the server is there, and that says that the session has ended.
    await nuxt.runWithContext(() => navigateTo({ path: '/sign-in', query: { next: useRouter().currentRoute.value.fullPath } }, { external: true }))
  })
  // Later the person may be in the middle of a form: whatever is sent next says that the session has ended.
  window.addEventListener('online', () => void session.confirm())
})
