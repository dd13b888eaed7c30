import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { fillPolicyAt } from '~~/server/utils/directory/datedRules'
import { directory } from '~~/server/utils/directory/directory'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { fillLimitAnswer } from '~~/server/utils/refrigerants/fillLimitAnswer'
import { fillLimitQuery } from '~~/utils/contract/refrigerants'

/** GET /api/fill-limit: how much a stamp may take, with its terms, without a cylinder. */
export default apiRoute({ permission: 'refrigerants:read', query: fillLimitQuery }, async ({ query }) => {
  const { fillPolicies } = await directory(useDatabase())
  return fillLimitAnswer(query, fillPolicyAt(fillPolicies, Date.now()))
})
