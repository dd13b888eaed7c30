import { replaceLines } from '~~/server/utils/cylinder-lists/drafts'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { shipmentLinesBody } from '~~/utils/contract/shipments'

/** PUT /api/shipments/{id}/lines: the whole list of a draft. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: shipmentLinesBody }, async ({ access, params, body }) => {
  await replaceLines(useDatabase(), { kind: 'shipment', id: params.id }, body.cylinderIds)
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
