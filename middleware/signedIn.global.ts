import { useSessionStore } from '~~/stores/session'

declare module '#app' {
  interface PageMeta {
    /** Open to people who are not signed in; `by-link`: who is signed in is not even asked. */
    public?: boolean | 'by-link'
  }
}

/** Every page is for people who are signed in, unless it says that it is public. */
export default defineNuxtRouteMiddleware(async (to) => {
  if (to.meta.public === 'by-link') return
  const session = useSessionStore()
  await session.load()
  if (session.user || to.meta.public) return
  return navigateTo({ path: '/sign-in', query: to.fullPath === '/' ? {} : { next: to.fullPath } })
})
