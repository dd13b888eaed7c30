import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { dockAnswer } from '~~/server/utils/dock/dockAnswer'
import { dockLinkOf } from '~~/server/utils/dock/dockGate'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dockParams } from '~~/utils/contract/dock'

/** GET /api/dock/{token}: the one shipment that the link opens; 404 for every link that opens nothing. */
export default apiRoute({ permission: 'public', params: dockParams }, ({ event }) =>
  dockAnswer(useDatabase(), dockLinkOf(event), Date.now()))
