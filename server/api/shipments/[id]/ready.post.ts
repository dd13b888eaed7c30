import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { readyShipment } from '~~/server/utils/shipments/readyShipment'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { actBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/ready: it may leave. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: actBody }, async ({ access, params, body }) => {
  await readyShipment(useDatabase(), params.id, body, access, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
