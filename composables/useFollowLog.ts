import { useApi } from '~~/composables/useApi'
import { useRefreshOnFocus } from '~~/composables/useRefreshOnFocus'
import type { LogHead } from '~~/utils/contract/log'

const ASKED_EVERY_MS = 4_000
const LONGEST_PAUSE_MS = 60_000
/** What is in no log, such as a draft or an invitation, is looked at again after so many questions. */
const QUESTIONS_BEFORE_ALL = 15

/**
 * Keeps a page as new as the custody log: asks how far the log has come while the page is looked at, and for the page
 * itself only when that has changed. Without an answer it asks ever less often.
 *
 * Shape: `seq` is how far the page has come; `refresh` fetches it again. `lost` says that the server is not heard.
 */
export function useFollowLog(seq: () => number | undefined, refresh: () => Promise<unknown>) {
  const api = useApi()
  const lost = ref(false)
  let pause = ASKED_EVERY_MS
  let questions = 0
  let isGone = false
  let timer: ReturnType<typeof setTimeout> | undefined

  function wait() {
    clearTimeout(timer)
    if (!isGone && document.visibilityState === 'visible') timer = setTimeout(ask, pause)
  }

  async function ask() {
    try {
      const head = await api.get<LogHead>('/api/log/head')
      questions++
      if (head.seq !== seq() || questions >= QUESTIONS_BEFORE_ALL) {
        questions = 0
        await refresh()
      }
      lost.value = false
      pause = ASKED_EVERY_MS
    }
    catch {
      lost.value = true
      pause = Math.min(pause * 2, LONGEST_PAUSE_MS)
    }
    wait()
  }

  onMounted(() => {
    document.addEventListener('visibilitychange', wait)
    wait()
  })
  onBeforeUnmount(() => {
    isGone = true
    clearTimeout(timer)
    document.removeEventListener('visibilitychange', wait)
  })
  useRefreshOnFocus(refresh)

  return { lost }
}
