import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { recordPrice } from '~~/server/utils/reclaim/recordedRows'
import { idParams } from '~~/utils/contract/parts'
import { priceBody } from '~~/utils/contract/reclaim'

/** POST /api/firms/{id}/prices: what a reclaimer pays and charges, from a day on. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'terms:set', params: idParams, body: priceBody, status: 201 }, ({ params, body, access }) =>
  recordPrice(useDatabase(), params.id, body, access, Date.now()))
