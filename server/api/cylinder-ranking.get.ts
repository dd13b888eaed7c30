import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { cylinderRanking } from '~~/server/utils/ranking/ranking'
import { rankingQuery } from '~~/utils/contract/ranking'

/** GET /api/cylinder-ranking: which cylinder takes an amount of a refrigerant, the best first, each with its reasons. */
export default apiRoute({ permission: 'fleet:read', query: rankingQuery }, ({ access, query }) => cylinderRanking(useDatabase(), query, access, Date.now()))
