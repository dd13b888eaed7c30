import { v7 as uuidv7 } from 'uuid'
import { problemOf, useApi } from '~~/composables/useApi'
import { useSessionStore } from '~~/stores/session'
import type { JobLine, JobsAnswer, NewJob } from '~~/utils/contract/jobs'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { inOrderFor } from '~~/utils/jobs/jobDraft'

const JOBS_SHOWN = 30

/**
 * The jobs that something may be of: the newest, one's own first, and one that is made here.
 *
 * @param chosen told of a job once it is chosen or made, with null where it is of none.
 * @param asked whether anything here may be of a job, and the one that was chosen before, which may be older than the newest.
 */
export function useJobChoice(chosen: (job: JobLine | null) => unknown, asked: { isAsked?: () => boolean, chosenId?: () => string } = {}) {
  const api = useApi()
  const session = useSessionStore()
  const jobs = shallowRef<JobLine[]>([])
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)
  // The same job sent again is the same one.
  let id = uuidv7()

  async function load() {
    if (asked.isAsked?.() === false) return
    // Without them it is recorded without a job.
    const answer = await api.get<JobsAnswer>('/api/jobs', { limit: JOBS_SHOWN }).catch(() => null)
    if (!answer) return
    const chosenId = asked.chosenId?.() ?? ''
    const older = chosenId && !answer.items.some(({ id }) => id === chosenId) ? await api.get<JobLine>(`/api/jobs/${chosenId}`).catch(() => null) : null
    jobs.value = [...inOrderFor(answer.items, session.user?.id ?? ''), ...older ? [older] : []]
  }

  function choose(jobId: string) {
    return chosen(jobs.value.find(job => job.id === jobId) ?? null)
  }

  async function make(job: NewJob) {
    busy.value = true
    problem.value = null
    try {
      const made = await api.post<JobLine>('/api/jobs', { id, ...job })
      id = uuidv7()
      jobs.value = [made, ...jobs.value]
      await chosen(made)
    }
    catch (error) {
      problem.value = problemOf(error)
    }
    finally {
      busy.value = false
    }
  }

  onMounted(load)
  return { jobs, busy, problem, choose, make, mayMake: computed(() => session.mayI('jobs:record')) }
}
