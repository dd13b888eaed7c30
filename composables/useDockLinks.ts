import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useEventIds } from '~~/composables/useEventIds'
import { useLoaded } from '~~/composables/useLoaded'
import type { DockLinksAnswer, NewDockLinkAnswer } from '~~/utils/contract/dock'

/** The links of a shipment to its reclaimer's dock: made, told this once, and withdrawn. */
export function useDockLinks(shipmentId: string) {
  const api = useApi()
  const path = `/api/shipments/${shipmentId}/dock-links`
  const links = useLoaded(`dock-links ${shipmentId}`, () => api.get<DockLinksAnswer>(path))
  const { busy, problem, attempt } = useAttempt()
  const idOf = useEventIds()
  const fresh = shallowRef<NewDockLinkAnswer | null>(null)

  function make(link: { forWhom: string, days: number, email?: string }) {
    return attempt(async () => {
      // The same words again after a lost answer are the same link; after a link was made they are another.
      const id = idOf(`${JSON.stringify(link)} after ${fresh.value?.link.id ?? 'none'}`)
      fresh.value = await api.post<NewDockLinkAnswer>(path, { id, ...link })
      await links.refresh()
    })
  }

  function revoke(linkId: string) {
    return attempt(async () => {
      await api.post(`${path}/${linkId}/revoke`, {})
      if (fresh.value?.link.id === linkId) fresh.value = null
      await links.refresh()
    })
  }

  return { links, fresh, busy, problem, make, revoke }
}
