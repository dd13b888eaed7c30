import { cancelDraft } from '~~/server/utils/cylinder-lists/drafts'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'

/** POST /api/shipments/{id}/cancel: gives a draft up and frees its cylinders. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams }, async ({ access, params }) => {
  await cancelDraft(useDatabase(), { kind: 'shipment', id: params.id })
  return shipmentWithLines(useDatabase(), params.id, access, Date.now())
})
