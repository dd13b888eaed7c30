import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { arriveShipment } from '~~/server/utils/shipments/arriveShipment'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { actBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/arrival: it has arrived. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, body: actBody }, async ({ access, params, body }) => {
  await arriveShipment(useDatabase(), params.id, body, access.personId, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
