import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { returnLines } from '~~/server/utils/shipments/returnLines'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { returnsBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/returns: cylinders of it that came back. With the same event ids it may be sent twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: returnsBody }, async ({ access, params, body }) => {
  await returnLines(useDatabase(), params.id, body, access, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
