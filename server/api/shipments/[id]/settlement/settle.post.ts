import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { settle } from '~~/server/utils/settlement/settle'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { idParams } from '~~/utils/contract/parts'
import { settleBody } from '~~/utils/contract/settlement'

/** POST /api/shipments/{id}/settlement/settle: all lines go into the log in one commit, or none does. With the same id it may be sent twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, body: settleBody }, async ({ access, params, body }) => {
  const now = Date.now()
  await settle(useDatabase(), params.id, body, access, now)
  return settlementAnswer(useDatabase(), params.id, now)
})
