import { problemOf } from '~~/composables/useApi'
import type { ProblemDetails } from '~~/utils/contract/problem'

/** One piece of work at a time on a page: that it is under way, and why it did not succeed. */
export function useAttempt() {
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)

  /** Whether the work was done. */
  async function attempt(work: () => Promise<unknown>): Promise<boolean> {
    busy.value = true
    problem.value = null
    try {
      await work()
      return true
    }
    catch (error) {
      problem.value = problemOf(error)
      return false
    }
    finally {
      busy.value = false
    }
  }

  return { busy, problem, attempt }
}
