import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { dockLinkOf } from '~~/server/utils/dock/dockGate'
import { takeEntries } from '~~/server/utils/dock/takeEntries'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dockEntriesBody, dockShipmentParams } from '~~/utils/contract/dock'

/** POST /api/dock/{token}/shipments/{id}/entries: what was said at the dock. With the same ids it may be sent twice. */
export default apiRoute({ permission: 'public', params: dockShipmentParams, body: dockEntriesBody }, ({ event, params, body }) =>
  takeEntries(useDatabase(), dockLinkOf(event), params.id, body, Date.now()))
