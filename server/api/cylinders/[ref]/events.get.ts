import { z } from 'zod'
import { page } from '../../../../utils/contract/parts'
import { pastQuery } from '../../../../utils/contract/past'
import { askedPast } from '../../../utils/custody/askedPast'
import { custodyLog } from '../../../utils/custody/custodyLog'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { withoutPrices } from '../../../utils/custody/withoutPrices'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'

const query = z.strictObject({ ...page, ...pastQuery, as: z.enum(['recorded', 'stands']).optional() })

/**
 * GET /api/cylinders/{ref}/events: its custody log, in order of effect, newest first; with `asOf` and `knownAt` as it stood
 * and was known then. `as=recorded` counts a correction from its own line on, else in the place of what it mends. What
 * a reclaimer paid is left out for who may not know it.
 */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams, query }, async ({ access, params, query }) => {
  const db = useDatabase()
  const log = await custodyLog(db, await theCylinder(db, params.ref), query, askedPast(query, Date.now()), query.as)
  return { ...log, items: withoutPrices(log.items, access) }
})
