import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { firmById } from '~~/server/utils/firms/firms'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { problem } from '~~/server/utils/http/problem'
import { idParams } from '~~/utils/contract/parts'
import type { Firm } from '~~/utils/contract/places'

/** GET /api/firms/{id}: one firm. 404 where there is none. */
export default apiRoute({ permission: 'firms:read', params: idParams }, async ({ params }): Promise<Firm> => {
  const firm = await firmById(useDatabase(), params.id)
  if (!firm) throw problem(404, 'No such firm', 'It may have been written wrongly.')
  return firm
})
