import { problemOf, useApi } from '~~/composables/useApi'
import type { FleetAnswer } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { stampFound, type StampFound } from '~~/utils/fleet/stampHits'

const MOST_ASKED = 200

/** The cylinders whose stamp has some typed characters; null before they are asked for. */
export function useStampSearch() {
  const api = useApi()
  const found = ref<StampFound | null>(null)

  /** Gives why it could not be asked, or null. */
  async function searchStamp(text: string): Promise<ProblemDetails | null> {
    try {
      const { items, total } = await api.get<FleetAnswer>('/api/cylinders', { q: text, limit: MOST_ASKED })
      found.value = stampFound(items, text, total)
      return null
    }
    catch (error) {
      return problemOf(error)
    }
  }

  return { found, searchStamp }
}
