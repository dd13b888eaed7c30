import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { setFigures } from '~~/server/utils/settlement/setFigures'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { idParams } from '~~/utils/contract/parts'
import { settlementLinesBody } from '~~/utils/contract/settlement'

/** PUT /api/shipments/{id}/settlement/lines: the reclaimer's figures of some lines. Refused where somebody changed them since (409). Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, body: settlementLinesBody }, async ({ access, params, body }) => {
  const now = Date.now()
  const lines = new Map(body.lines.map(({ cylinderId, ...figures }) => [cylinderId, figures]))
  await setFigures(useDatabase(), params.id, { act: { id: body.id, occurredAt: body.occurredAt, kind: 'figures-set' }, revision: body.revision, lines }, access, now)
  return settlementAnswer(useDatabase(), params.id, now)
})
