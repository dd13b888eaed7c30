import { z } from 'zod'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { cylinderView } from '../../../utils/custody/cylinderViews'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'

const query = z.strictObject({ refrigerant: z.string().min(1).max(40).optional() })

/** GET /api/cylinders/{ref}: everything that is to be said of one cylinder today; `refrigerant` asks about one to come. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams, query }, async ({ access, params, query }) => {
  const db = useDatabase()
  const id = await theCylinder(db, params.ref)
  return cylinderView(db, id, { access, nowMs: Date.now(), askedRefrigerant: query.refrigerant })
})
