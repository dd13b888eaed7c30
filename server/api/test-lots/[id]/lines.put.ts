import { replaceLines } from '~~/server/utils/cylinder-lists/drafts'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { testLotWithLines } from '~~/server/utils/test-lots/testLotWithLines'
import { idParams } from '~~/utils/contract/parts'
import { testLotLinesBody } from '~~/utils/contract/testLots'

/** PUT /api/test-lots/{id}/lines: the whole list of a draft. Safe to send twice. */
export default apiRoute({ permission: 'lots:prepare', params: idParams, body: testLotLinesBody }, async ({ access, params, body }) => {
  await replaceLines(useDatabase(), { kind: 'test-lot', id: params.id }, body.cylinderIds)
  return testLotWithLines(useDatabase(), params.id, access, Date.now())
})
