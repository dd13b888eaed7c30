import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { makePlan } from '~~/server/utils/plan/makePlan'
import { planBody } from '~~/utils/contract/plans'

/** POST /api/plans: works a plan out, within ten seconds, and keeps it. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'shipments:prepare', body: planBody, status: 201 }, ({ access, body }) => makePlan(useDatabase(), body, access, Date.now()))
