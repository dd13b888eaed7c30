import { apiRoute } from '~~/server/utils/http/apiRoute'
import { evacuationLevelAnswer } from '~~/server/utils/recovery/evacuationLevelAnswer'
import { evacuationLevelQuery } from '~~/utils/contract/recovery'

/** GET /api/evacuation-level: what an appliance must be evacuated to before it is opened, and whether it was reached. */
export default apiRoute({ permission: 'refrigerants:read', query: evacuationLevelQuery }, ({ query }) => evacuationLevelAnswer(query))
