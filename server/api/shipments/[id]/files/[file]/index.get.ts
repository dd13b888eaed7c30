import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { useFiles } from '~~/server/utils/files/photoFiles'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { sendFile } from '~~/server/utils/settlement/sendFile'
import { readFile } from '~~/server/utils/settlement/shipmentFiles'
import { shipmentFileParams } from '~~/utils/contract/shipmentFiles'

/** GET /api/shipments/{id}/files/{file}: one file, to be saved and never shown as a page of ours. */
export default apiRoute({ permission: 'shipments:read', params: shipmentFileParams }, async ({ event, params }) =>
  sendFile(event, await readFile(useDatabase(), useFiles(), params.id, params.file)))
