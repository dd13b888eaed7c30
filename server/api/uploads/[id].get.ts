import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { photoFile } from '~~/server/utils/files/photoFile'
import { useFiles } from '~~/server/utils/files/photoFiles'
import { sendPhoto } from '~~/server/utils/files/sendPhoto'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { idParams } from '~~/utils/contract/parts'
import { uploadQuery } from '~~/utils/contract/uploads'

/** GET /api/uploads/{id}: a photo, or its thumbnail. */
export default apiRoute({ permission: 'fleet:read', params: idParams, query: uploadQuery }, async ({ event, params, query }) =>
  sendPhoto(event, params.id, await photoFile(useDatabase(), useFiles(), params.id, query.size)))
