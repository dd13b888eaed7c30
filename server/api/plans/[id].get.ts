import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { planDetails } from '~~/server/utils/plan/plans'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/plans/{id}: a plan as it was made, and what has been done of it. */
export default apiRoute({ permission: 'fleet:read', params: idParams }, ({ access, params }) => planDetails(useDatabase(), params.id, access, Date.now()))
