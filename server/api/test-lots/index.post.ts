import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { createTestLot } from '~~/server/utils/test-lots/createTestLot'
import { testLotWithLines } from '~~/server/utils/test-lots/testLotWithLines'
import { testLotBody } from '~~/utils/contract/testLots'

/** POST /api/test-lots: a draft. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'lots:prepare', body: testLotBody, status: 201 }, async ({ access, body }) => {
  const now = Date.now()
  const id = await createTestLot(useDatabase(), body, access.personId, now)
  return testLotWithLines(useDatabase(), id, access, now)
})
