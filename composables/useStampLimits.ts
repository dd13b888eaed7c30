import { watchDebounced } from '@vueuse/core'
import { useApi } from '~~/composables/useApi'
import type { FillLimitAnswer } from '~~/utils/contract/refrigerants'
import { massText } from '~~/utils/quantity/mass'
import type { RegistrationDraft } from '~~/utils/registration/draft'
import { splitSpec } from '~~/utils/requalification/specs'

const PAUSE_MS = 400
const MOST_SHOWN = 6

/** What a stamp, as far as it is typed, would allow of some refrigerants: the ones it is about first, then the given ones. */
export function useStampLimits(draft: Ref<RegistrationDraft | null>, others: Ref<readonly string[]>) {
  const api = useApi()
  const limits = shallowRef<{ refrigerant: string, answer: FillLimitAnswer | null }[]>([])
  let asking = 0

  const waiting = computed(() => {
    const typed = draft.value
    if (!typed || typed.spec.trim() === '') return 'Copy the specification, TW and WC: the limits appear here.'
    if (!splitSpec(typed.spec)) return 'The specification cannot be read yet.'
    if (!typed.waterCapacity) return 'Without WC there is no limit.'
    return null
  })
  const question = computed(() => {
    const typed = draft.value
    if (!typed || waiting.value !== null) return null
    const about = [typed.contents === 'refrigerant' ? typed.refrigerant : '', typed.dedicatedTo, ...others.value].filter(name => name !== '')
    return {
      refrigerants: [...new Set(about)].slice(0, MOST_SHOWN),
      stamp: {
        spec: typed.spec.trim(),
        waterCapacity: typed.waterCapacity ? massText(typed.waterCapacity) : undefined,
        tareWeight: typed.tareWeight ? massText(typed.tareWeight) : undefined,
        flammableMarked: typed.flammableMarked === true,
      },
    }
  })

  async function ask() {
    const asked = question.value
    const mine = ++asking
    if (!asked) {
      limits.value = []
      return
    }
    const answers = await Promise.all(asked.refrigerants.map(async refrigerant => ({
      refrigerant,
      answer: await api.get<FillLimitAnswer>('/api/fill-limit', { ...asked.stamp, refrigerant }).catch(() => null),
    })))
    // An answer to what was typed before is not shown beside what is typed now.
    if (mine === asking) limits.value = answers
  }

  watchDebounced(() => JSON.stringify(question.value), ask, { debounce: PAUSE_MS })

  return { limits, waiting }
}
