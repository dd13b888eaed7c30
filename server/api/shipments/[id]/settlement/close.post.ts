import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { closeShipment } from '~~/server/utils/settlement/closeShipment'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { idParams } from '~~/utils/contract/parts'
import { closeBody } from '~~/utils/contract/settlement'

/** POST /api/shipments/{id}/settlement/close: nothing is argued about any more; refused while a dispute is open (409). Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, body: closeBody }, async ({ access, params, body }) => {
  const now = Date.now()
  await closeShipment(useDatabase(), params.id, body, access.personId, now)
  return settlementAnswer(useDatabase(), params.id, now)
})
