import { defineNitroPlugin } from '#imports'
import { keepFollowing } from '../utils/custody/rowsByRule'
import { useDatabase } from '../utils/database/currentDatabase'

/** From the start on, the rows of the fleet follow the firm's rules. */
export default defineNitroPlugin((nitro) => {
  if (import.meta.prerender) return
  const end = keepFollowing(useDatabase())
  nitro.hooks.hook('close', end)
})
