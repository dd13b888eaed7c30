import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { reopenDispute } from '~~/server/utils/settlement/disputeActs'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { disputeParams, disputeReopenBody } from '~~/utils/contract/settlement'

/** POST /api/shipments/{id}/disputes/{dispute}/reopen: opens an ended dispute again. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: disputeParams, body: disputeReopenBody }, async ({ access, params, body }) => {
  const now = Date.now()
  await reopenDispute(useDatabase(), params.dispute, body, { shipmentId: params.id, personId: access.personId, now })
  return settlementAnswer(useDatabase(), params.id, now)
})
