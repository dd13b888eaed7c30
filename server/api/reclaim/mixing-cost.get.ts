import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { mixingCostOf } from '~~/server/utils/settlement/mixingCostOf'
import { mixingCostQuery } from '~~/utils/contract/settlement'

/** GET /api/reclaim/mixing-cost: what mixing cost in the shipments that were settled in a year. */
export default apiRoute({ permission: 'terms:read', query: mixingCostQuery }, ({ query }) => mixingCostOf(useDatabase(), query.year))
