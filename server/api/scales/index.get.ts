import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { listScales } from '~~/server/utils/scales/scales'
import { scalesQuery, type ScalesAnswer } from '~~/utils/contract/scales'

/** GET /api/scales: the whole list, by name. */
export default apiRoute({ permission: 'scales:read', query: scalesQuery }, async ({ query }): Promise<ScalesAnswer> => {
  const items = await listScales(useDatabase(), { active: query.active === undefined ? undefined : query.active === 'true' })
  return { items, nextCursor: null, total: items.length }
})
