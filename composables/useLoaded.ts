import type { Ref, WatchSource } from 'vue'
import { problemOf } from '~~/composables/useApi'

/**
 * Something asked of the server: what came, why it did not, and whether it is still on its way.
 *
 * What came before stays on the screen while it is asked for again.
 */
export function useLoaded<T>(key: string, load: () => Promise<T>, watched: WatchSource[] = []) {
  const request = useAsyncData<T>(key, load, { watch: watched, deep: false })
  const { data, error, status, refresh } = request
  return {
    /** Done once it came, or failed, for the first time. */
    ready: request.then(() => undefined),
    data: data as Ref<T | null | undefined>,
    problem: computed(() => error.value ? problemOf(error.value) : null),
    waiting: computed(() => status.value === 'pending' || status.value === 'idle'),
    refresh: () => refresh(),
  }
}
