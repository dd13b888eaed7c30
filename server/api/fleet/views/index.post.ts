import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { nameFleetView } from '~~/server/utils/fleet-views/views'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { fleetViewBody } from '~~/utils/contract/fleetViews'

/** POST /api/fleet/views: gives filters and an order a name of one's own. Sent twice: 409, for the name is taken. */
export default apiRoute({ permission: 'fleet:read', body: fleetViewBody, status: 201 }, ({ person, body }) =>
  nameFleetView(useDatabase(), person.id, body, Date.now()))
