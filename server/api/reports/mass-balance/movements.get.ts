import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { balanceMovements } from '~~/server/utils/records/balanceMovements'
import { balanceMovementsQuery } from '~~/utils/contract/massBalance'

/** GET /api/reports/mass-balance/movements: the movements behind one line of a balance, newest first, in pages. */
export default apiRoute({ permission: 'reports:read', query: balanceMovementsQuery }, ({ query }) => balanceMovements(useDatabase(), query, Date.now()))
