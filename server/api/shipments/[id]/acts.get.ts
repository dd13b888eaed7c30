import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { actsOf } from '~~/server/utils/shipments/acts'
import { theShipment } from '~~/server/utils/shipments/shipments'
import { idParams } from '~~/utils/contract/parts'
import type { ShipmentActsAnswer } from '~~/utils/shipment/acts'

/** GET /api/shipments/{id}/acts: what was done to a shipment, by whom. */
export default apiRoute({ permission: 'shipments:read', params: idParams }, async ({ params }): Promise<ShipmentActsAnswer> => {
  await theShipment(useDatabase(), params.id)
  return { items: await actsOf(useDatabase(), params.id) }
})
