import { problemOf, useApi } from '~~/composables/useApi'
import type { CylinderRow, FleetAnswer } from '~~/utils/contract/custody'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { stampHits } from '~~/utils/fleet/stampHits'

const MOST_ASKED = 200
const MOST_FOUND = 20

/** The cylinders whose stamp has some typed characters; null before they are asked for. */
export function useStampSearch() {
  const api = useApi()
  const found = ref<CylinderRow[] | null>(null)

  /** Gives why it could not be asked, or null. */
  async function searchStamp(text: string): Promise<ProblemDetails | null> {
    try {
      const { items } = await api.get<FleetAnswer>('/api/cylinders', { q: text, limit: MOST_ASKED })
      found.value = stampHits(items, text).slice(0, MOST_FOUND)
      return null
    }
    catch (error) {
      return problemOf(error)
    }
  }

  return { found, searchStamp }
}
