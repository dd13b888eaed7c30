import { defineNitroPlugin } from '#imports'

/** Nobody needs to know what serves the pages. */
export default defineNitroPlugin((nitro) => {
  nitro.hooks.hook('render:response', (response) => {
    if (response.headers) Reflect.deleteProperty(response.headers, 'x-powered-by')
  })
})
