import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { renameFleetView } from '~~/server/utils/fleet-views/views'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { fleetViewChange } from '~~/utils/contract/fleetViews'
import { idParams } from '~~/utils/contract/parts'

/** PATCH /api/fleet/views/{id}: gives one's own view another name. Safe to send twice. */
export default apiRoute({ permission: 'fleet:read', params: idParams, body: fleetViewChange }, ({ person, params, body }) =>
  renameFleetView(useDatabase(), person.id, params.id, body.name))
