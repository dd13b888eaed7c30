import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { takeStatementOver } from '~~/server/utils/settlement/statementTakeOver'
import { idParams } from '~~/utils/contract/parts'
import { csvTakeOverForm } from '~~/utils/contract/settlement'

/**
 * POST /api/shipments/{id}/settlement/csv-take-over: takes the rows over in which nothing is wrong, as the preview showed
 * them; refused where file or figures are others now (409). Safe to send twice.
 */
export default apiRoute({ permission: 'shipments:receive', params: idParams, form: csvTakeOverForm }, async ({ access, params, form }) => {
  const now = Date.now()
  await takeStatementOver(useDatabase(), params.id, form, access, now)
  return settlementAnswer(useDatabase(), params.id, now)
})
