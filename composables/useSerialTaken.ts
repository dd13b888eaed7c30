import { watchDebounced } from '@vueuse/core'
import { useApi } from '~~/composables/useApi'
import type { FleetAnswer } from '~~/utils/contract/custody'

const PAUSE_MS = 400

/** Whether the fleet knows a serial already; null while nothing is typed, or nobody could be asked. */
export function useSerialTaken(serial: () => string) {
  const api = useApi()
  const taken = ref<boolean | null>(null)
  const trimmed = computed(() => serial().trim())

  async function ask(asked: string) {
    if (asked === '') return
    const found = await api.get<FleetAnswer>('/api/cylinders', { q: asked, limit: 50 }).catch(() => null)
    if (trimmed.value !== asked) return
    taken.value = found && found.items.some(row => row.serial?.toLowerCase() === asked.toLowerCase())
  }

  watch(trimmed, () => {
    taken.value = null
  })
  watchDebounced(trimmed, ask, { debounce: PAUSE_MS })

  return readonly(taken)
}
