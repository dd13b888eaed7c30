import { problemOf, useApi } from '~~/composables/useApi'
import type { CylinderRow, FleetAnswer } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'

const MOST_FOUND = 8

/** The cylinders whose stamp has some typed characters; null before they are asked for. */
export function useStampSearch() {
  const api = useApi()
  const found = ref<CylinderRow[] | null>(null)

  /** Gives why it could not be asked, or null. */
  async function searchStamp(text: string): Promise<ProblemDetails | null> {
    try {
      found.value = (await api.get<FleetAnswer>('/api/cylinders', { q: text, limit: MOST_FOUND })).items
      return null
    }
    catch (error) {
      return problemOf(error)
    }
  }

  return { found, searchStamp }
}
