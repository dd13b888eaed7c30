import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { listFirms } from '~~/server/utils/firms/firms'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { firmsQuery, type FirmsAnswer } from '~~/utils/contract/places'

/** GET /api/firms: the whole list, by name. */
export default apiRoute({ permission: 'firms:read', query: firmsQuery }, async ({ query }): Promise<FirmsAnswer> => {
  const active = query.active === undefined ? undefined : query.active === 'true'
  const items = await listFirms(useDatabase(), { active, kind: query.kind })
  return { items, nextCursor: null, total: items.length }
})
