import { ApiError, problemOf, useApi } from '~~/composables/useApi'
import { useLoaded } from '~~/composables/useLoaded'
import type { CylinderRow, CylinderView } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { Finding } from '~~/utils/custody/finding'
import { readScannedText } from '~~/utils/label/code'
import { changedLines, cylinderName } from '~~/utils/shipment/changedLines'

/** What a shipment and a test lot have in common. */
export interface CylinderList { id: string, state: string, lines: { cylinder: CylinderRow, version: number, because: Finding[] }[] }

/** A shipment or a test lot with its lines; whatever is done to it answers with the list as it then is. */
export function useActedList<L extends CylinderList>(path: string) {
  const api = useApi()
  const loaded = useLoaded(path, () => api.get<L>(path))
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)
  /** What happened to its cylinders since they were looked at. */
  const changes = ref<string[]>([])

  /** Does something that answers with the list as it then is; a conflict shows what changed meanwhile. */
  async function act(work: () => Promise<L>): Promise<boolean> {
    busy.value = true
    problem.value = null
    changes.value = []
    try {
      loaded.data.value = await work()
      return true
    }
    catch (error) {
      problem.value = withNames(problemOf(error))
      if (problem.value.status === 409) await lookAgain()
      return false
    }
    finally {
      busy.value = false
    }
  }

  // The server counts the lines of a request; a person knows cylinders.
  function withNames(found: ProblemDetails): ProblemDetails {
    const errors = found.errors?.map((one) => {
      const line = loaded.data.value?.lines[Number(/^lines\.(\d+)/.exec(one.path)?.[1] ?? -1)]
      return line ? { ...one, path: cylinderName(line.cylinder) } : one
    })
    return errors ? { ...found, errors } : found
  }

  async function lookAgain() {
    const before = loaded.data.value?.lines ?? []
    await loaded.refresh()
    changes.value = changedLines(before, loaded.data.value?.lines ?? [])
  }

  function ids(): string[] {
    return loaded.data.value?.lines.map(line => line.cylinder.id) ?? []
  }

  /** The id of the cylinder with a code, or a serial, that is to come onto the list. */
  async function newOne(typed: string): Promise<string> {
    const ref = readScannedText(typed)?.code ?? typed.trim()
    const view = await api.get<CylinderView>(`/api/cylinders/${encodeURIComponent(ref)}`)
    if (ids().includes(view.id)) throw new ApiError({ type: 'about:blank', title: 'It is on the list already', status: 422, detail: '' })
    return view.id
  }

  return { ...loaded, busy, actProblem: problem, changes, act, ids, newOne }
}
