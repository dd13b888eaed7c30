import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { filesOf, tieFile } from '~~/server/utils/settlement/shipmentFiles'
import { fileLinesBody, shipmentFileParams, type ShipmentFilesAnswer } from '~~/utils/contract/shipmentFiles'

/** PUT /api/shipments/{id}/files/{file}/lines: ties a file to lines, or to the whole shipment by none. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: shipmentFileParams, body: fileLinesBody }, async ({ access, params, body }): Promise<ShipmentFilesAnswer> => {
  await tieFile(useDatabase(), params.file, body, { shipmentId: params.id, personId: access.personId, now: Date.now() })
  return { items: await filesOf(useDatabase(), params.id) }
})
