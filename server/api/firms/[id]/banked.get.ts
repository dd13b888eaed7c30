import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { bankedOf } from '~~/server/utils/jobs/banked'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/firms/{id}/banked: the refrigerant that is a customer’s, what moved of it, and what was credited for it: for who may read prices. */
export default apiRoute({ permission: 'terms:read', params: idParams }, ({ params }) => bankedOf(useDatabase(), params.id))
