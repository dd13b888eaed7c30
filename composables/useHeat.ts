import type { Heat } from '~~/utils/picture/heat'
import type { HeatQuestion } from '~~/utils/picture/heatQuestion'

/**
 * How what is in a cylinder behaves with heat: worked out here from the catalogue, which is fetched when `open` is first
 * called; from then on it follows the question.
 */
export function useHeat(question: Ref<HeatQuestion | null>) {
  const heat = shallowRef<Heat | null>(null)
  const failed = ref<string | null>(null)
  const isOpen = ref(false)
  let asking = 0

  async function work() {
    const asked = question.value
    const mine = ++asking
    failed.value = null
    if (!asked) {
      heat.value = null
      return
    }
    try {
      const [{ CATALOGUE }, { heatOf }] = await Promise.all([import('~~/utils/refrigerant/allRefrigerants'), import('~~/utils/picture/heat')])
      if (mine !== asking) return
      heat.value = heatOf(asked, CATALOGUE)
      if (heat.value === null) failed.value = 'The catalogue has no table for this refrigerant.'
    }
    catch {
      if (mine === asking) failed.value = 'No connection: the picture could not be fetched.'
    }
  }

  async function open() {
    isOpen.value = true
    if (heat.value === null) await work()
  }

  watch(() => JSON.stringify(question.value), () => {
    if (isOpen.value) void work()
  })

  return { heat, failed, open }
}
