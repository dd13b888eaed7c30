import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { sendCsv, settlementTable } from '~~/server/utils/settlement/settlementCsv'
import { idParams } from '~~/utils/contract/parts'
import { settlementCsvQuery } from '~~/utils/contract/settlement'

/** GET /api/shipments/{id}/settlement/csv: the settlement as a table of values, or an empty statement to be filled in. */
export default apiRoute({ permission: 'shipments:read', params: idParams, query: settlementCsvQuery }, async ({ event, params, query }) =>
  sendCsv(event, await settlementTable(useDatabase(), params.id, query, Date.now())))
