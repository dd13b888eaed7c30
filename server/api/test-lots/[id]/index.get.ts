import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { testLotWithLines } from '~~/server/utils/test-lots/testLotWithLines'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/test-lots/{id}: a test lot with its lines. */
export default apiRoute({ permission: 'lots:read', params: idParams }, ({ access, params }) =>
  testLotWithLines(useDatabase(), params.id, access, Date.now()))
