import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { keepFleetLayout } from '~~/server/utils/fleet-views/layout'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { fleetLayoutBody } from '~~/utils/contract/fleetViews'

/** PUT /api/fleet/layout: keeps how one has the table of the fleet. Safe to send twice. */
export default apiRoute({ permission: 'fleet:read', body: fleetLayoutBody }, ({ person, body }) => keepFleetLayout(useDatabase(), person.id, body))
