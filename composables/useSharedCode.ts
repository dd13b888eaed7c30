import { useApi } from '~~/composables/useApi'
import type { CylinderView, FleetAnswer } from '~~/utils/contract/custody'
import { endsStamp } from '~~/utils/fleet/stampHits'

/** Far more than ever share a code by mistake. */
const MOST_ON_TWO = 200

/** Tells apart the cylinders that share a code by mistake. */
export function useSharedCode() {
  const api = useApi()

  /**
   * The cylinders that have a code and whose stamped serial ends as typed. Several are as good as none: one of them would
   * be taken for the other.
   */
  async function ofCode(code: string, serialEnd: string): Promise<CylinderView[]> {
    const { items } = await api.get<FleetAnswer>('/api/cylinders', { finding: 'code-on-two', limit: MOST_ON_TWO })
    const ending = items.filter(row => endsStamp(row.serial, serialEnd))
    const views = await Promise.all(ending.map(row => api.get<CylinderView>(`/api/cylinders/${row.id}`)))
    return views.filter(({ labelCode, oldLabelCodes }) => [labelCode, ...oldLabelCodes].includes(code))
  }

  return { ofCode }
}
