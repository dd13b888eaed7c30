import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dispatchTestLot } from '~~/server/utils/test-lots/dispatchTestLot'
import { testLotWithLines } from '~~/server/utils/test-lots/testLotWithLines'
import { idParams } from '~~/utils/contract/parts'
import { testLotDispatchBody } from '~~/utils/contract/testLots'

/** POST /api/test-lots/{id}/dispatch: everything leaves in one commit or nothing does. With the same event ids it may be sent twice. */
export default apiRoute({ permission: 'lots:dispatch', params: idParams, body: testLotDispatchBody }, async ({ access, params, body }) => {
  await dispatchTestLot(useDatabase(), params.id, body, access, Date.now())
  return testLotWithLines(useDatabase(), params.id, access, Date.now())
})
