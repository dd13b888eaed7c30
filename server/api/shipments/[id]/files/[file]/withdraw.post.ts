import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { filesOf, withdrawFile } from '~~/server/utils/settlement/shipmentFiles'
import { fileWithdrawBody, shipmentFileParams, type ShipmentFilesAnswer } from '~~/utils/contract/shipmentFiles'

/** POST /api/shipments/{id}/files/{file}/withdraw: takes a file off the shipment; the history keeps that it was there. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: shipmentFileParams, body: fileWithdrawBody }, async ({ access, params, body }): Promise<ShipmentFilesAnswer> => {
  await withdrawFile(useDatabase(), params.file, body, { shipmentId: params.id, personId: access.personId, now: Date.now() })
  return { items: await filesOf(useDatabase(), params.id) }
})
