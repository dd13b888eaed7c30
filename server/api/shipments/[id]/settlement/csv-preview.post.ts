import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { previewStatement } from '~~/server/utils/settlement/statementTakeOver'
import { idParams } from '~~/utils/contract/parts'
import { csvPreviewForm } from '~~/utils/contract/settlement'

/** POST /api/shipments/{id}/settlement/csv-preview: what a statement's table would change, row by row. Nothing is taken over. */
export default apiRoute({ permission: 'shipments:receive', params: idParams, form: csvPreviewForm }, ({ params, form }) =>
  previewStatement(useDatabase(), params.id, form, Date.now()))
