import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { termsRecorded } from '~~/server/utils/reclaim/recordedRows'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/firms/{id}/terms: what a reclaimer takes, past and to come, with who recorded it and when. */
export default apiRoute({ permission: 'terms:read', params: idParams }, ({ params }) => termsRecorded(useDatabase(), params.id, Date.now()))
