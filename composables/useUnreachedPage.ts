import { useApi } from '~~/composables/useApi'
import type { Health } from '~~/utils/contract/firm'

/**
 * What is said when the script of the next page cannot be fetched: empty while all is well.
 *
 * Without signal this page stays, with all that was typed into it. Where the server answers, its pages are newer than
 * this one, and the next one is opened afresh.
 */
export function useUnreachedPage() {
  const api = useApi()
  const router = useRouter()
  const text = ref('')
  const failures = new Set<unknown>()

  function clear() {
    text.value = ''
  }

  useNuxtApp().hook('app:chunkError', ({ error }) => {
    failures.add(error)
  })
  if (import.meta.client) {
    router.beforeEach(() => {
      failures.clear()
      clear()
    })
    router.onError(async (error, to) => {
      if (!failures.has(error)) return
      const isReached = await api.get<Health>('/api/health').then(() => true, () => false)
      if (isReached) reloadNuxtApp({ path: to.fullPath })
      else text.value = 'No connection, so this page stays. Try again when there is signal.'
    })
  }

  return { text, clear }
}
