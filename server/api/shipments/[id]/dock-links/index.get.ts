import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { linksOf } from '~~/server/utils/dock/dockLinks'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import type { DockLinksAnswer } from '~~/utils/contract/dock'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/shipments/{id}/dock-links: the links of a shipment to its reclaimer's dock, without what opens. */
export default apiRoute({ permission: 'shipments:read', params: idParams }, async ({ params }): Promise<DockLinksAnswer> =>
  ({ items: await linksOf(useDatabase(), params.id, Date.now()) }))
