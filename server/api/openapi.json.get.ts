import { apiRoute } from '~~/server/utils/http/apiRoute'
import { describedApi } from '~~/server/utils/openapi/describedApi'

/** GET /api/openapi.json: what every route takes and who may call it. */
export default apiRoute({ permission: 'signed-in' }, () => describedApi())
