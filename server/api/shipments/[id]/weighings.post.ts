import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { weighLine } from '~~/server/utils/shipments/weighLine'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'
import { weighingBody } from '~~/utils/contract/shipments'

/** POST /api/shipments/{id}/weighings: one cylinder as it was scanned and weighed. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: weighingBody }, async ({ access, params, body }) => {
  await weighLine(useDatabase(), params.id, body, access.personId, Date.now())
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
