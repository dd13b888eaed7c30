import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { removeFleetView } from '~~/server/utils/fleet-views/views'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { idParams } from '~~/utils/contract/parts'

/** DELETE /api/fleet/views/{id}: forgets one's own view. Sent twice: 404. */
export default apiRoute({ permission: 'fleet:read', params: idParams, status: 204 }, async ({ person, params }) => {
  await removeFleetView(useDatabase(), person.id, params.id)
  return null
})
