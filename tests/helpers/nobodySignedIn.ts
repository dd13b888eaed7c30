import { registerEndpoint } from '@nuxt/test-utils/runtime'
import { createError } from 'h3'

// Nobody is signed in: the sign-in middleware asks before a component is mounted, and a stray error would hide a real one.
registerEndpoint('/api/session', () => {
  throw createError({ statusCode: 401 })
})
