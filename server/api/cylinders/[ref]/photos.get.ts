import type { CylinderPhotosAnswer } from '../../../../utils/contract/uploads'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { cylinderPhotos } from '../../../utils/files/cylinderPhotos'
import { apiRoute } from '../../../utils/http/apiRoute'

/** GET /api/cylinders/{ref}/photos: its photos by event, with how many are still on their way. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams }, async ({ params }): Promise<CylinderPhotosAnswer> => {
  const db = useDatabase()
  return cylinderPhotos(db, await theCylinder(db, params.ref))
})
