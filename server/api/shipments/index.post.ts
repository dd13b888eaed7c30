import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { createShipment } from '~~/server/utils/shipments/createShipment'
import { shipmentWithLines } from '~~/server/utils/shipments/shipmentWithLines'
import { shipmentBody } from '~~/utils/contract/shipments'

/** POST /api/shipments: a draft. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'shipments:prepare', body: shipmentBody, status: 201 }, async ({ access, body }) => {
  const now = Date.now()
  const id = await createShipment(useDatabase(), body, access.personId, now)
  return shipmentWithLines(useDatabase(), id, access, now)
})
