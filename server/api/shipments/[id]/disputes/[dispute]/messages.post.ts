import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { addMessage } from '~~/server/utils/settlement/disputeActs'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { disputeParams, disputeMessageBody } from '~~/utils/contract/settlement'

/** POST /api/shipments/{id}/disputes/{dispute}/messages: something said in a dispute, with photos. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: disputeParams, body: disputeMessageBody }, async ({ access, params, body }) => {
  const now = Date.now()
  await addMessage(useDatabase(), params.dispute, body, { shipmentId: params.id, personId: access.personId, now })
  return settlementAnswer(useDatabase(), params.id, now)
})
