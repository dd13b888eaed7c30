import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { openDispute } from '~~/server/utils/settlement/disputeActs'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { idParams } from '~~/utils/contract/parts'
import { disputeBody } from '~~/utils/contract/settlement'

/** POST /api/shipments/{id}/disputes: a person opens a dispute. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, body: disputeBody }, async ({ access, params, body }) => {
  const now = Date.now()
  await openDispute(useDatabase(), body, { shipmentId: params.id, personId: access.personId, now })
  return settlementAnswer(useDatabase(), params.id, now)
})
