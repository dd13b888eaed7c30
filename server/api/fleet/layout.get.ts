import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { fleetLayoutOf } from '~~/server/utils/fleet-views/layout'
import { apiRoute } from '~~/server/utils/http/apiRoute'

/** GET /api/fleet/layout: how one has the table of the fleet. */
export default apiRoute({ permission: 'fleet:read' }, ({ person }) => fleetLayoutOf(useDatabase(), person.id))
