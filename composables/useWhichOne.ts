import { useApi } from '~~/composables/useApi'
import type { CylinderView, FleetAnswer } from '~~/utils/contract/custody'
import { endsStamp } from '~~/utils/fleet/stampHits'
import { isCodeOnTwo } from '~~/utils/picture/verdict'

/** Far more than ever share a code by mistake. */
const MOST_ON_TWO = 200

/** Which of the cylinders with one code is meant, by the end of the serial on its collar. */
export function useWhichOne(code: Ref<string | null>, view: Ref<CylinderView | null | undefined>) {
  const api = useApi()
  const confirmedId = ref<string | null>(null)
  const isWrong = ref(false)

  const asks = computed(() => code.value !== null && view.value !== null && view.value !== undefined
    && isCodeOnTwo(view.value) && confirmedId.value !== view.value.id)

  /** Both of two that end alike are none: one of them would be taken for the other. */
  async function answer(lastFour: string) {
    isWrong.value = false
    const [one, another] = await haveCode(lastFour).catch(() => [])
    if (one === undefined || another !== undefined) isWrong.value = true
    else if (one.id === view.value?.id) confirmedId.value = one.id
    else await navigateTo(`/c/${one.id}`)
  }

  /** The cylinders that have the code and whose serial ends so. */
  async function haveCode(lastFour: string): Promise<CylinderView[]> {
    const { items } = await api.get<FleetAnswer>('/api/cylinders', { finding: 'code-on-two', limit: MOST_ON_TWO })
    const fitting = await Promise.all(items.filter(row => endsStamp(row.serial, lastFour)).map(row => api.get<CylinderView>(`/api/cylinders/${row.id}`)))
    return fitting.filter(({ labelCode, oldLabelCodes }) => [labelCode, ...oldLabelCodes].includes(code.value))
  }

  return { asks, isWrong, answer }
}
