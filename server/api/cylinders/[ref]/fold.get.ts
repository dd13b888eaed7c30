import { foldInput } from '../../../utils/custody/custodyLog'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { withoutPrices } from '../../../utils/custody/withoutPrices'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'

/** GET /api/cylinders/{ref}/fold: its recorded events, for a browser that judges a draft by the same rules. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams }, async ({ access, params }) => {
  const db = useDatabase()
  const input = await foldInput(db, await theCylinder(db, params.ref))
  return { ...input, events: withoutPrices(input.events, access) }
})
