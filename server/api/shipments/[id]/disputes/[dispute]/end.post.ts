import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { endDispute } from '~~/server/utils/settlement/disputeActs'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { disputeParams, disputeEndBody } from '~~/utils/contract/settlement'

/** POST /api/shipments/{id}/disputes/{dispute}/end: ends a dispute with its outcome and the reason. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: disputeParams, body: disputeEndBody }, async ({ access, params, body }) => {
  const now = Date.now()
  await endDispute(useDatabase(), params.dispute, body, { shipmentId: params.id, personId: access.personId, now })
  return settlementAnswer(useDatabase(), params.id, now)
})
