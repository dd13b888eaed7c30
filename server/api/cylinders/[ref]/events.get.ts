import { z } from 'zod'
import { page } from '../../../../utils/contract/parts'
import { custodyLog } from '../../../utils/custody/custodyLog'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'

const query = z.strictObject(page)

/** GET /api/cylinders/{ref}/events: its custody log, in order of effect, newest first. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams, query }, async ({ params, query }) => {
  const db = useDatabase()
  return custodyLog(db, await theCylinder(db, params.ref), query)
})
