import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { cancelShipment } from '~~/server/utils/shipments/cancelShipment'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { cancelBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/cancel: gives one up that has not left, and frees its cylinders. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: cancelBody }, async ({ access, params, body }) => {
  await cancelShipment(useDatabase(), params.id, body, access.personId, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
