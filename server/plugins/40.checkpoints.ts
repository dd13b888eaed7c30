import { defineNitroPlugin } from '#imports'
import { useDatabase } from '../utils/database/currentDatabase'
import { keepCheckpointing } from '../utils/proof/dailyCheckpoints'

/** From the start on, the custody log is signed each day. */
export default defineNitroPlugin((nitro) => {
  if (import.meta.prerender) return
  const end = keepCheckpointing(useDatabase())
  nitro.hooks.hook('close', end)
})
