import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { useEnvironment } from '../../../utils/environment'
import { apiRoute } from '../../../utils/http/apiRoute'
import { contentsTagOf } from '../../../utils/labels/contentsTag'

/** GET /api/cylinders/{ref}/contents-tag: what the tag of its present contents says, or in words why it gets none. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams }, async ({ access, params }) => {
  const db = useDatabase()
  return contentsTagOf(db, await theCylinder(db, params.ref), { access, nowMs: Date.now(), publicUrl: useEnvironment().publicUrl })
})
