import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { classifyLine } from '~~/server/utils/shipments/classifyLine'
import { papersOf } from '~~/server/utils/shipments/papersOf'
import { classificationBody, classificationParams } from '~~/utils/contract/papers'

/** PUT /api/shipments/{id}/lines/{cylinderId}/classification: how the shipper says a line travels, until it has left. Safe to send twice. */
export default apiRoute({ permission: 'shipments:prepare', params: classificationParams, body: classificationBody }, async ({ access, params, body }) => {
  const asking = { access, nowMs: Date.now() }
  await classifyLine(useDatabase(), params.id, params.cylinderId, body, asking)
  return papersOf(useDatabase(), params.id, asking)
})
