import { useJobChoice } from '~~/composables/useJobChoice'
import type { ActLists } from '~~/utils/contract/actLists'
import type { CylinderView } from '~~/utils/contract/custody'
import { ownerOfJob } from '~~/utils/jobs/jobDraft'

/**
 * The job that the event in a form is of, as `JobChoice` shows it; null where what happened is of no job.
 *
 * What comes out of equipment is whose the job says; what goes back goes into that customer's equipment.
 */
export function useActJob(input: {
  kind: () => string | undefined
  draft: () => Record<string, unknown>
  view: () => CylinderView | null | undefined
  lists: () => ActLists | null
  refreshLists: () => unknown
}) {
  const isOfJob = () => input.kind() === 'filled' || input.kind() === 'drawn'
  const text = (key: string) => String(input.draft()[key] ?? '')
  const { jobs, busy, problem, mayMake, choose, make } = useJobChoice(async (job) => {
    const draft = input.draft()
    draft.jobId = job?.id ?? ''
    if (job === null) return
    if (input.kind() === 'drawn') draft.toOwnerId = job.customer.id ?? ''
    else {
      draft.ownerId = ownerOfJob(job)
      if (text('refrigerant') === '' && job.refrigerant) draft.refrigerant = job.refrigerant
    }
    // A customer made with the job is not on the list that was fetched before.
    if (job.customer.id && !input.lists()?.firms.some(({ id }) => id === job.customer.id)) await input.refreshLists()
  }, { isAsked: isOfJob, chosenId: () => text('jobId') })

  return computed(() => {
    const lists = input.lists()
    if (!isOfJob() || !lists) return null
    return {
      chosenId: text('jobId'),
      jobs: jobs.value,
      customers: lists.firms.filter(({ kind }) => kind === 'customer'),
      refrigerants: lists.refrigerants,
      refrigerant: lists.refrigerants.find(name => name === text('refrigerant')) ?? input.view()?.contents.refrigerant ?? '',
      mayMake: mayMake.value,
      busy: busy.value,
      problem: problem.value,
      onChoose: choose,
      onMake: make,
    }
  })
}
