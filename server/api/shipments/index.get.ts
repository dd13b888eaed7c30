import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { listShipments } from '~~/server/utils/shipments/shipments'
import { shipmentsQuery } from '~~/utils/contract/shipments'

/** GET /api/shipments: the shipments, the newest first. */
export default apiRoute({ permission: 'shipments:read', query: shipmentsQuery }, ({ query }) => listShipments(useDatabase(), query))
