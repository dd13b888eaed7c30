import { defineNitroPlugin } from '#imports'
import { stopSolver } from '../utils/plan/solver'

/** A plan that is being worked out does not hold the server up when it ends. */
export default defineNitroPlugin((nitro) => {
  nitro.hooks.hook('close', stopSolver)
})
