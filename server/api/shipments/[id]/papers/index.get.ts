import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { papersOf } from '~~/server/utils/shipments/papersOf'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/shipments/{id}/papers: what its papers say, as it left or as a draft. */
export default apiRoute({ permission: 'shipments:read', params: idParams }, ({ access, params }) =>
  papersOf(useDatabase(), params.id, { access, nowMs: Date.now() }))
