import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { chooseCarrier } from '~~/server/utils/shipments/chooseCarrier'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { carrierBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/carrier: who carries it. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: carrierBody }, async ({ access, params, body }) => {
  await chooseCarrier(useDatabase(), params.id, body, access.personId, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
