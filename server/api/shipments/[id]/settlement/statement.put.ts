import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { setFigures } from '~~/server/utils/settlement/setFigures'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { idParams } from '~~/utils/contract/parts'
import { settlementStatementBody } from '~~/utils/contract/settlement'

/** PUT /api/shipments/{id}/settlement/statement: what the statement says of the whole shipment. Refused where somebody changed it since (409). Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, body: settlementStatementBody }, async ({ access, params, body }) => {
  const now = Date.now()
  const { id, occurredAt, revision, ...statement } = body
  await setFigures(useDatabase(), params.id, { act: { id, occurredAt, kind: 'figures-set' }, revision, lines: new Map(), statement }, access, now)
  return settlementAnswer(useDatabase(), params.id, now)
})
