import { useSharedCode } from '~~/composables/useSharedCode'
import type { CylinderView } from '~~/utils/contract/custody'
import { isCodeOnTwo } from '~~/utils/picture/verdict'

/** Which of the cylinders with one code is meant, by the end of the serial on its collar. */
export function useWhichOne(code: Ref<string | null>, view: Ref<CylinderView | null | undefined>) {
  const { ofCode } = useSharedCode()
  const confirmedId = ref<string | null>(null)
  const isWrong = ref(false)

  const asks = computed(() => code.value !== null && view.value !== null && view.value !== undefined
    && isCodeOnTwo(view.value) && confirmedId.value !== view.value.id)

  async function answer(lastFour: string) {
    isWrong.value = false
    const [one, another] = await ofCode(code.value ?? '', lastFour).catch(() => [])
    if (one === undefined || another !== undefined) isWrong.value = true
    else if (one.id === view.value?.id) confirmedId.value = one.id
    else await navigateTo(`/c/${one.id}`)
  }

  return { asks, isWrong, answer }
}
