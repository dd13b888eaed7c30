import { useSessionStore } from '~~/stores/session'
import { PHOTOS_WAIT_KEY } from '~~/utils/photo/waitKey'

/** Photos that were left on this device go on their way, as soon as somebody is signed in and the page stands. */
export default defineNuxtPlugin((nuxt) => {
  nuxt.hook('app:suspense:resolve', async () => {
    if (!useSessionStore().user || !isAnythingLeft()) return
    const { usePhotosStore } = await import('~~/stores/photos')
    await nuxt.runWithContext(() => usePhotosStore().load())
  })
})

function isAnythingLeft(): boolean {
  try {
    return localStorage.getItem(PHOTOS_WAIT_KEY) !== null
  }
  catch {
    return false
  }
}
