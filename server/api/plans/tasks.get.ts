import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { cylinderTasks } from '~~/server/utils/plan/plans'
import { planTasksQuery } from '~~/utils/contract/plans'

/** GET /api/plans/tasks?cylinder=: what open plans have left to do with a cylinder. */
export default apiRoute({ permission: 'fleet:read', query: planTasksQuery }, ({ query }) => cylinderTasks(useDatabase(), query.cylinder, Date.now()))
