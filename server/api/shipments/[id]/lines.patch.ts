import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { changeLines } from '~~/server/utils/shipments/changeLines'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { shipmentLinesBody } from '~~/utils/contract/shipments'

/** PATCH /api/shipments/{id}/lines: cylinders onto and off the list of one that has not left. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: shipmentLinesBody }, async ({ access, params, body }) => {
  await changeLines(useDatabase(), params.id, body, access.personId, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
