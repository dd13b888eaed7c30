import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { createLink } from '~~/server/utils/dock/dockLinks'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dockLinkBody } from '~~/utils/contract/dock'
import { idParams } from '~~/utils/contract/parts'

/** POST /api/shipments/{id}/dock-links: a link for the dock, told this once. With the same id it may be sent twice. */
export default apiRoute({ permission: 'shipments:dispatch', params: idParams, body: dockLinkBody, status: 201 }, ({ access, params, body }) =>
  createLink(useDatabase(), params.id, body, access, Date.now()))
