import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { pricesRecorded } from '~~/server/utils/reclaim/recordedRows'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/firms/{id}/prices: what a reclaimer pays and charges, past and to come, with who recorded it and when. */
export default apiRoute({ permission: 'terms:read', params: idParams }, ({ params }) => pricesRecorded(useDatabase(), params.id, Date.now()))
