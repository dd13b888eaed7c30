import { useApi } from '~~/composables/useApi'
import type { CylinderTasksAnswer } from '~~/utils/contract/plans'

/** What open plans have left to do with a cylinder; nothing while that is not known. */
export function useCylinderTasks(cylinderId: () => string | null) {
  const api = useApi()
  const tasks = shallowRef<CylinderTasksAnswer['items']>([])
  onMounted(() => watch(cylinderId, async (id) => {
    tasks.value = id === null ? [] : await api.get<CylinderTasksAnswer>('/api/plans/tasks', { cylinder: id }).then(({ items }) => items, () => [])
  }, { immediate: true }))
  return tasks
}
