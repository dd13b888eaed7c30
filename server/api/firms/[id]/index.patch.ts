import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { changeFirm } from '~~/server/utils/firms/changeFirm'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { idParams } from '~~/utils/contract/parts'
import { firmChange } from '~~/utils/contract/places'

/** PATCH /api/firms/{id}: changes what is given and leaves the rest. Safe to send twice. */
export default apiRoute({ permission: 'firms:manage', params: idParams, body: firmChange }, ({ params, body }) =>
  changeFirm(useDatabase(), params.id, body))
