import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { vanAnswer } from '~~/server/utils/vans/vans'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/vans/{id}: what is aboard, what else it carries, and what its last check-in missed. */
export default apiRoute({ permission: 'fleet:read', params: idParams }, ({ params }) => vanAnswer(useDatabase(), params.id, Date.now()))
