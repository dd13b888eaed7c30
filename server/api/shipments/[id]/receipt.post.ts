import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { receiveShipment } from '~~/server/utils/shipments/receiveShipment'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { receiptBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/receipt: what the reclaimer found on each line. With the same event ids it may be sent twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, body: receiptBody }, async ({ access, params, body }) => {
  await receiveShipment(useDatabase(), params.id, body, access, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
