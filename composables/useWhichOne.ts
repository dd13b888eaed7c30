import { useApi } from '~~/composables/useApi'
import type { CylinderView, FleetAnswer } from '~~/utils/contract/custody'
import { endsStamp } from '~~/utils/fleet/stampHits'
import { isCodeOnTwo } from '~~/utils/picture/verdict'

/** Which of two cylinders with one code is meant, by the end of the serial on its collar. */
export function useWhichOne(code: Ref<string | null>, view: Ref<CylinderView | null | undefined>) {
  const api = useApi()
  const confirmedId = ref<string | null>(null)
  const isWrong = ref(false)

  const asks = computed(() => code.value !== null && view.value !== null && view.value !== undefined
    && isCodeOnTwo(view.value) && confirmedId.value !== view.value.id)

  async function answer(lastFour: string) {
    isWrong.value = false
    if (view.value && endsStamp(view.value.stamp?.serial ?? null, lastFour)) {
      confirmedId.value = view.value.id
      return
    }
    const fleet = await api.get<FleetAnswer>('/api/cylinders', { q: lastFour, limit: 20 }).catch(() => null)
    const other = fleet?.items.filter(row => row.id !== view.value?.id && endsStamp(row.serial, lastFour)) ?? []
    if (other.length === 1) await navigateTo(`/c/${other[0]!.id}`)
    else isWrong.value = true
  }

  return { asks, isWrong, answer }
}
