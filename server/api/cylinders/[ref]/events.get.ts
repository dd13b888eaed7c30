import { z } from 'zod'
import { page } from '../../../../utils/contract/parts'
import { pastQuery } from '../../../../utils/contract/past'
import { askedPast } from '../../../utils/custody/askedPast'
import { custodyLog } from '../../../utils/custody/custodyLog'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'

const query = z.strictObject({ ...page, ...pastQuery })

/** GET /api/cylinders/{ref}/events: its custody log, in order of effect, newest first; with `asOf` and `knownAt` as it stood and was known then. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams, query }, async ({ params, query }) => {
  const db = useDatabase()
  return custodyLog(db, await theCylinder(db, params.ref), query, askedPast(query, Date.now()))
})
