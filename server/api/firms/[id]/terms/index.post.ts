import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { recordTerms } from '~~/server/utils/reclaim/recordedRows'
import { idParams } from '~~/utils/contract/parts'
import { termsBody } from '~~/utils/contract/reclaim'

/** POST /api/firms/{id}/terms: what a reclaimer takes, from a day on. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'terms:set', params: idParams, body: termsBody, status: 201 }, ({ params, body, access }) =>
  recordTerms(useDatabase(), params.id, body, access, Date.now()))
