import type { OpenListAnswer } from '../../../../utils/contract/custody'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { openListsOf } from '../../../utils/cylinder-lists/openLists'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'

/** GET /api/cylinders/{ref}/open-list: the open shipment or test lot that a cylinder stands on. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams }, async ({ params }): Promise<OpenListAnswer> => {
  const id = await theCylinder(useDatabase(), params.ref)
  return { list: (await openListsOf(useDatabase(), [id])).get(id) ?? null }
})
