import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { linksOf, revokeLink } from '~~/server/utils/dock/dockLinks'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dockLinkParams, type DockLinksAnswer } from '~~/utils/contract/dock'

/** POST /api/shipments/{id}/dock-links/{link}/revoke: withdraws a link for good. Safe to send twice. */
export default apiRoute({ permission: 'shipments:dispatch', params: dockLinkParams }, async ({ access, params }): Promise<DockLinksAnswer> => {
  await revokeLink(useDatabase(), params.id, params.link, access, Date.now())
  return { items: await linksOf(useDatabase(), params.id, Date.now()) }
})
