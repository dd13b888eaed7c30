import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { returnTestLot } from '~~/server/utils/test-lots/returnTestLot'
import { testLotWithLines } from '~~/server/utils/test-lots/testLotWithLines'
import { idParams } from '~~/utils/contract/parts'
import { testLotReturnBody } from '~~/utils/contract/testLots'

/** POST /api/test-lots/{id}/return: lines that are back and what the test found. With the same event ids it may be sent twice. */
export default apiRoute({ permission: 'lots:receive', params: idParams, body: testLotReturnBody }, async ({ access, params, body }) => {
  await returnTestLot(useDatabase(), params.id, body, access, Date.now())
  return testLotWithLines(useDatabase(), params.id, access, Date.now())
})
