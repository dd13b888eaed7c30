import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { withdrawPrice } from '~~/server/utils/reclaim/recordedRows'
import { firmRowParams } from '~~/utils/contract/reclaim'

/** POST /api/firms/{id}/prices/{rowId}/withdraw: takes back what has not begun, or was recorded today. Safe to send twice. */
export default apiRoute({ permission: 'terms:set', params: firmRowParams }, ({ params, access }) =>
  withdrawPrice(useDatabase(), params.id, params.rowId, access, Date.now()))
