import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { filesOf } from '~~/server/utils/settlement/shipmentFiles'
import { theShipment } from '~~/server/utils/shipments/shipments'
import { idParams } from '~~/utils/contract/parts'
import type { ShipmentFilesAnswer } from '~~/utils/contract/shipmentFiles'

/** GET /api/shipments/{id}/files: its statements and certificates. */
export default apiRoute({ permission: 'shipments:read', params: idParams }, async ({ params }): Promise<ShipmentFilesAnswer> => {
  const { id } = await theShipment(useDatabase(), params.id)
  return { items: await filesOf(useDatabase(), id) }
})
