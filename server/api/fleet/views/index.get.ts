import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { fleetViewsOf } from '~~/server/utils/fleet-views/views'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import type { FleetViewsAnswer } from '~~/utils/contract/fleetViews'

/** GET /api/fleet/views: one's own named views of the fleet. */
export default apiRoute({ permission: 'fleet:read' }, async ({ person }): Promise<FleetViewsAnswer> =>
  ({ items: await fleetViewsOf(useDatabase(), person.id) }))
