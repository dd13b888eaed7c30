import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { listTestLots } from '~~/server/utils/test-lots/testLots'
import { testLotsQuery } from '~~/utils/contract/testLots'

/** GET /api/test-lots: the test lots, the newest first. */
export default apiRoute({ permission: 'lots:read', query: testLotsQuery }, ({ query }) => listTestLots(useDatabase(), query))
