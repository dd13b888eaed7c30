import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dispatchShipment } from '~~/server/utils/shipments/dispatchShipment'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { dispatchBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/dispatch: everything leaves in one commit or nothing does. With the same event ids it may be sent twice. */
export default apiRoute({ permission: 'shipments:dispatch', params: idParams, body: dispatchBody }, async ({ access, params, body }) => {
  await dispatchShipment(useDatabase(), params.id, body, access, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
