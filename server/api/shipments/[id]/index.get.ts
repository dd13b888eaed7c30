import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/shipments/{id}: a shipment with its lines. */
export default apiRoute({ permission: 'shipments:read', params: idParams }, ({ access, params }) =>
  shipmentWithLines(useDatabase(), params.id, access, Date.now()))
