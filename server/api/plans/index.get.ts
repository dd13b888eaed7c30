import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { listPlans } from '~~/server/utils/plan/plans'

/** GET /api/plans: the plans, the newest first, each with how far it has come. */
export default apiRoute({ permission: 'fleet:read' }, ({ access }) => listPlans(useDatabase(), access, Date.now()))
