import { useApi } from '~~/composables/useApi'
import type { FleetAnswer } from '~~/utils/contract/custody'
import { codeDiagnosis } from '~~/utils/label/codeDiagnosis'

const MOST_NEAR = 12

/** Offers those codes one slip away from a typed one that the fleet knows, once the ninth character does not fit. */
export function useNearCodes(typed: Ref<string>) {
  const api = useApi()
  const near = ref<string[]>([])

  watch(typed, async (text) => {
    near.value = []
    const diagnosis = codeDiagnosis(text)
    if (diagnosis.state !== 'compare') return
    const answers = await Promise.all(diagnosis.nearCodes.slice(0, MOST_NEAR).map(async (code) => {
      const answer = await api.get<FleetAnswer>('/api/cylinders', { label: code, limit: 1 }).catch(() => null)
      return answer?.items.length ? code : null
    }))
    if (typed.value === text) near.value = answers.filter(code => code !== null)
  })
  return near
}
