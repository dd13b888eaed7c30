import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { dockLinkOf } from '~~/server/utils/dock/dockGate'
import { dockPhoto } from '~~/server/utils/dock/dockPhotos'
import { useFiles } from '~~/server/utils/files/photoFiles'
import { sendPhoto } from '~~/server/utils/files/sendPhoto'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dockPhotoParams } from '~~/utils/contract/dock'
import { uploadQuery } from '~~/utils/contract/uploads'

/** GET /api/dock/{token}/photos/{id}: a photo that came over this very link, or its thumbnail. */
export default apiRoute({ permission: 'public', params: dockPhotoParams, query: uploadQuery }, async ({ event, params, query }) =>
  sendPhoto(event, params.id, await dockPhoto(useDatabase(), useFiles(), dockLinkOf(event), params.id, query.size)))
