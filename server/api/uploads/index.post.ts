import { uploadForm, type UploadAnswer } from '~~/utils/contract/uploads'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { keepPhoto } from '~~/server/utils/files/keepPhoto'
import { useFiles } from '~~/server/utils/files/photoFiles'
import { apiRoute } from '~~/server/utils/http/apiRoute'

/**
 * POST /api/uploads: keeps one photo, drawn anew without what else was in its file. The event that names it does not
 * wait for it. Sent again with the same content it is answered as before; with another it is refused, 409.
 */
export default apiRoute({ permission: 'events:post', form: uploadForm }, ({ access, form }): Promise<UploadAnswer> =>
  keepPhoto(useDatabase(), useFiles(), form, access, Date.now()))
