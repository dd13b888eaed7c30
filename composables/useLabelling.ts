import { problemOf, useApi } from '~~/composables/useApi'
import { deviceNow, usePostingStore } from '~~/stores/posting'
import type { CylinderView } from '~~/utils/contract/custody'
import type { MintAnswer } from '~~/utils/contract/labels'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'

/** A cylinder whose label is to be printed. */
export interface ToLabel { id: string, labelCode: string | null, serial: string | null, placeId: string | null }

/** Makes codes and gives a code to cylinders that have none. */
export function useLabelling() {
  const api = useApi()
  const posting = usePostingStore()
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)

  async function cylinders(ids: readonly string[]): Promise<ToLabel[]> {
    const views = await Promise.all(ids.map(id => api.get<CylinderView>(`/api/cylinders/${id}`)))
    return views.map(view => ({ id: view.id, labelCode: view.labelCode, serial: view.stamp?.serial ?? null, placeId: view.place?.id ?? null }))
  }

  /** Codes of blank labels. */
  function mint(count: number): Promise<string[] | null> {
    return attempt(async () => (await api.post<MintAnswer>('/api/labels', { count })).codes)
  }

  /**
   * Gives each of these cylinders a new code and records it, in place of the one that it has; answers them as they then
   * are. `reason` says why a label is replaced.
   */
  function label(these: readonly ToLabel[], reason?: string): Promise<ToLabel[] | null> {
    return attempt(async () => {
      const { codes } = await api.post<MintAnswer>('/api/labels', { count: these.length })
      const occurredAt = deviceNow()
      const events = these.map(({ id, labelCode, placeId }, index) => posting.seal<'labelled'>({
        cylinderId: id, kind: 'labelled', occurredAt,
        details: { code: codes[index]!, ...(labelCode && { replaces: labelCode, ...(reason && { reason }) }) },
        ...(placeId ? { placeId } : {}),
      }) as CustodyEvent)
      const settled = await posting.postAll(events)
      const refused = settled.find(one => one.problem !== null)
      if (refused?.problem) problem.value = refused.problem
      return these.map((one, index) => settled[index]?.problem ? one : { ...one, labelCode: codes[index]! })
    })
  }

  async function attempt<T>(work: () => Promise<T>): Promise<T | null> {
    busy.value = true
    problem.value = null
    try {
      return await work()
    }
    catch (error) {
      problem.value = problemOf(error)
      return null
    }
    finally {
      busy.value = false
    }
  }

  return { cylinders, mint, label, busy, problem }
}
