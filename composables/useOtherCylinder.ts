import { problemOf, useApi } from '~~/composables/useApi'
import { useScanEntry } from '~~/composables/useScanEntry'
import { useScanSignal } from '~~/composables/useScanSignal'
import type { CylinderView } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { formatLabelCode } from '~~/utils/label/code'

/**
 * The second cylinder of what happens between two: scanned or typed, then looked up by its id as it stands for a
 * refrigerant.
 *
 * Shape: `id` is kept by the form; `refrigerant` is asked about, null for none.
 */
export function useOtherCylinder(input: { id: () => string, choose: (id: string) => void, ownId: () => string | null, refrigerant: () => string | null }) {
  const api = useApi()
  const signal = useScanSignal()
  const view = shallowRef<CylinderView | null>(null)
  const problem = ref<ProblemDetails | null>(null)
  const told = ref<string | null>(null)
  let turn = 0

  const { mode, entry, stampProblem } = useScanEntry({ take, isStopped: () => false, isOver: () => input.id() !== '' })

  async function take(reference: string) {
    told.value = null
    problem.value = null
    try {
      const found = await api.get<CylinderView>(`/api/cylinders/${reference}`)
      if (found.id === input.ownId()) {
        told.value = 'That is this cylinder itself. Scan the other one.'
        return signal('stop')
      }
      input.choose(found.id)
      signal('ok')
    }
    catch (error) {
      const why = problemOf(error)
      if (why.status === 404) told.value = `${formatLabelCode(reference)} is on no cylinder. Register it first, or scan another.`
      else problem.value = why
      signal('unk')
    }
  }

  async function lookUp() {
    const mine = ++turn
    const id = input.id()
    if (id === '') {
      view.value = null
      return
    }
    const refrigerant = input.refrigerant()
    try {
      const found = await api.get<CylinderView>(`/api/cylinders/${id}`, refrigerant ? { refrigerant } : undefined)
      if (mine === turn) view.value = found
    }
    catch (error) {
      if (mine === turn) problem.value = problemOf(error)
    }
  }

  onMounted(() => watch(() => [input.id(), input.refrigerant()], lookUp, { immediate: true }))
  return { view, problem, told, mode, entry, stampProblem }
}
