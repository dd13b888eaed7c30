import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { dockLinkOf } from '~~/server/utils/dock/dockGate'
import { keepDockPhoto } from '~~/server/utils/dock/dockPhotos'
import { useFiles } from '~~/server/utils/files/photoFiles'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { dockParams, dockPhotoForm } from '~~/utils/contract/dock'
import type { UploadAnswer } from '~~/utils/contract/uploads'

/** POST /api/dock/{token}/photos: a photo that an entry of this link names, drawn anew. Sent again it is answered as before. */
export default apiRoute({ permission: 'public', params: dockParams, form: dockPhotoForm }, ({ event, form }): Promise<UploadAnswer> =>
  keepDockPhoto(useDatabase(), useFiles(), dockLinkOf(event), form, Date.now()))
