import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dropPlan, planDetails } from '~~/server/utils/plan/plans'
import { idParams } from '~~/utils/contract/parts'
import { planPatch } from '~~/utils/contract/plans'

/** PATCH /api/plans/{id}: it is followed no longer. Sent twice it is dropped once. */
export default apiRoute({ permission: 'shipments:prepare', params: idParams, body: planPatch }, async ({ access, params }) => {
  const now = Date.now()
  await dropPlan(useDatabase(), params.id, now)
  return planDetails(useDatabase(), params.id, access, now)
})
