import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { useFiles } from '~~/server/utils/files/photoFiles'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { addFile, filesOf } from '~~/server/utils/settlement/shipmentFiles'
import { idParams } from '~~/utils/contract/parts'
import { shipmentFileForm, type ShipmentFilesAnswer } from '~~/utils/contract/shipmentFiles'

/** POST /api/shipments/{id}/files: a statement or certificate, known by its content and not by its name. Safe to send twice. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, form: shipmentFileForm }, async ({ access, params, form }): Promise<ShipmentFilesAnswer> => {
  await addFile(useDatabase(), useFiles(), form, { shipmentId: params.id, personId: access.personId, now: Date.now() })
  return { items: await filesOf(useDatabase(), params.id) }
})
